import assert from 'node:assert/strict';
import { product } from '#server/db/in-practice.ts';
import { Clip } from '#server/features/clips/clip.entity.ts';
import { patiently } from './client.ts';
import type { Task } from './task.ts';

/** A clip that comes whole, as a script sends it: where the answer was lost, it is sent again. */
export const formUpload: Task = {
  name: 'form upload',
  within: 200,
  prepare: async (place) => {
    const { visit } = await place.newVisit();
    const path = `/api/visits/${visit.id}/clips`;
    let told = '';
    let sent = 0;
    return {
      act: async () => {
        const taken = await patiently(() => {
          sent += 1;
          const form = new FormData();
          form.set('view', 'front');
          form.set('clip', new Blob([new Uint8Array(place.clip)]), 'clip.mp4');
          return place.ask('POST', path, { form });
        });
        assert.equal(taken.status, 201, JSON.stringify(taken.body));
        told = String(taken.body.id);
      },
      kept: async () => {
        const clips = await place.inPractice(product(place.practiceId), ({ em }) =>
          em.find(Clip, { visit: visit.id }),
        );
        assert.ok(
          clips.some(({ id }) => id === told),
          'a clip that was acknowledged is there',
        );
        assert.ok(clips.length <= sent, 'each sending made one clip at most');
        for (const { state, bytes } of clips) {
          assert.equal(state, 'ready', 'a clip that was taken in is ready');
          assert.equal(bytes, place.clip.length);
        }
      },
    };
  },
};

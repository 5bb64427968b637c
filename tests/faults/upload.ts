import assert from 'node:assert/strict';
import { setTimeout as pause } from 'node:timers/promises';
import { product } from '#server/db/in-practice.ts';
import { Clip } from '#server/features/clips/clip.entity.ts';
import { patiently } from './client.ts';
import type { Place } from './place.ts';
import type { Task } from './task.ts';

const PIECES = 4;
const TUS = { 'Tus-Resumable': '1.0.0' };

/** Sends a clip in pieces. What the server once said it has, it must still have. */
export const sendClip = async ({ ask, clip }: Place, visitId: string): Promise<string> => {
  const opened = await patiently(() =>
    ask('POST', `/api/visits/${visitId}/uploads`, {
      json: { name: 'clip.mp4', bytes: clip.length, view: 'front' },
    }),
  );
  assert.equal(opened.status, 201, JSON.stringify(opened.body));
  const id = String(opened.body.id);
  const path = `/api/uploads/${id}`;
  let has = 0;
  while (has < clip.length) {
    const piece = clip.subarray(has, has + Math.ceil(clip.length / PIECES));
    const sent = await ask('PATCH', path, {
      bytes: piece,
      headers: {
        ...TUS,
        'Upload-Offset': String(has),
        'Content-Type': 'application/offset+octet-stream',
      },
    });
    if (sent?.status === 204) {
      has = Number(sent.headers.get('upload-offset'));
      continue;
    }
    const asked = await patiently(() => ask('HEAD', path, { headers: TUS }));
    assert.equal(asked.status, 200, 'an upload that was acknowledged is not known any more');
    const now = Number(asked.headers.get('upload-offset'));
    if (now === has) await pause(20);
    assert.ok(now >= has, `of ${has} bytes that were acknowledged, ${now} are left`);
    has = now;
  }
  return id;
};

const clipTask = (name: string, within: number, ahead: boolean): Task => ({
  name,
  within,
  prepare: async (place) => {
    const { visit } = await place.newVisit();
    let id = ahead ? await sendClip(place, visit.id) : '';
    return {
      act: async () => {
        if (!ahead) id = await sendClip(place, visit.id);
      },
      kept: async () => {
        const clip = await place.inPractice(product(place.practiceId), ({ em }) =>
          em.findOne(Clip, { id }),
        );
        assert.equal(clip?.state, 'ready', 'a clip that was taken in is ready');
        assert.equal(clip.bytes, place.clip.length);
      },
    };
  },
});

/** The kill comes while it is sent. */
export const upload = clipTask('upload', 250, false);
/** The kill comes once it was sent. */
export const preparation = clipTask('preparation', 1500, true);

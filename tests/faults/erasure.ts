import assert from 'node:assert/strict';
import { randomUUID } from 'node:crypto';
import { product } from '#server/db/in-practice.ts';
import { athletePrefix } from '#server/features/athletes/athlete-files.ts';
import { Athlete } from '#server/features/athletes/athlete.entity.ts';
import { makeClip } from '#server/features/clips/clip.factory.ts';
import { clipFiles } from '#server/features/clips/clip-files.ts';
import { type Answer, patiently } from './client.ts';
import type { Task } from './task.ts';

const CLIPS = 4;

/** An athlete goes, with clips, a scan of a consent and an upload under way. */
export const erasure: Task = {
  name: 'erasure',
  within: 400,
  prepare: async (place) => {
    const { athlete, visit } = await place.newVisit();
    await place.inPractice(product(place.practiceId), ({ em }) => {
      for (let n = 0; n < CLIPS; n++) {
        const id = randomUUID();
        const files = clipFiles(place.practiceId, id);
        Object.values(files).forEach(place.putFile);
        makeClip(em, { id, files, visit, uploadedBy: place.owner });
      }
      return Promise.resolve();
    });
    place.putFile(`${athletePrefix(place.practiceId, athlete.id)}/consents/scan`);
    await place.ask('POST', `/api/visits/${visit.id}/uploads`, {
      json: { name: 'clip.mp4', bytes: 1000, view: 'front' },
    });
    return {
      act: async () => {
        let lost = false;
        const name = `${athlete.givenName} ${athlete.familyName}`;
        const done: Answer = await patiently(async () => {
          const answer = await place.ask('POST', `/api/athletes/${athlete.id}/erase`, {
            json: { name },
          });
          lost ||= answer === null || answer.status >= 500;
          return answer;
        });
        // one whose answer was lost was done all the same
        assert.ok(done.status < 300 || (lost && done.status === 404), JSON.stringify(done.body));
      },
      // that no file of theirs is left is asked of every run
      kept: async () => {
        const left = await place.inPractice(product(place.practiceId), ({ em }) =>
          em.count(Athlete, { id: athlete.id }),
        );
        assert.equal(left, 0, 'who was erased is gone');
      },
    };
  },
};

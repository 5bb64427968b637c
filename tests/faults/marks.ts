import assert from 'node:assert/strict';
import { randomUUID } from 'node:crypto';
import { product } from '#server/db/in-practice.ts';
import { makeClip } from '#server/features/clips/clip.factory.ts';
import { clipFiles } from '#server/features/clips/clip-files.ts';
import { makeRep } from '#server/features/reps/rep.factory.ts';
import { goldenClip } from '#tests/support/golden.ts';
import { patiently } from './client.ts';
import { call } from './post.ts';
import type { Task } from './task.ts';

const BATCH = 40;

/** Marks come in batches; a batch whose answer was lost is sent again, and the reading follows by itself. */
export const marking: Task = {
  name: 'marking',
  within: 600,
  prepare: async (place) => {
    const { visit } = await place.newVisit();
    const { geometry, frames, width, height, reps, trial } = goldenClip('g03_early_single');
    const [golden] = reps;
    assert.ok(golden);
    const id = randomUUID();
    const files = clipFiles(place.practiceId, id);
    Object.values(files).forEach(place.putFile);
    const rep = await place.inPractice(product(place.practiceId), ({ em }) => {
      const facts = { geometry, frames, width, height, frameCount: frames.count };
      const clip = makeClip(em, { id, files, visit, uploadedBy: place.owner, ...facts });
      const { startFrame, endFrame } = golden;
      const { supportSide } = trial;
      return Promise.resolve(
        makeRep(em, { clip, createdBy: place.owner, supportSide, startFrame, endFrame }),
      );
    });
    const marks = `/api/reps/${rep.id}/marks`;
    await call(place, visit.id, trial.supportSide);
    return {
      act: async () => {
        for (let at = 0; at < golden.commands.length; at += BATCH) {
          const commands = golden.commands.slice(at, at + BATCH);
          const saved = await patiently(() => place.ask('POST', marks, { json: { commands } }));
          assert.equal(saved.status, 200, JSON.stringify(saved.body));
          for (const { outcome } of saved.body.outcomes as { outcome: string }[])
            assert.notEqual(outcome, 'conflict', 'nobody else marks here');
        }
      },
      kept: async () => {
        const { body } = await patiently(() => place.ask('GET', marks));
        const stored = body.items as { revision: number }[];
        assert.equal(stored.length, golden.commands.length, 'every mark is there');
        assert.ok(
          stored.every(({ revision }) => revision === 1),
          'none was placed twice',
        );
        const read = await place.inPractice(product(place.practiceId), ({ em }) =>
          em.execute<{ read: boolean }[]>(
            'select reading_id is not null and not stale as read from side_setting where visit_id = ?',
            [visit.id],
          ),
        );
        assert.deepEqual(read, [{ read: true }], 'the reading followed the marks');
      },
    };
  },
};

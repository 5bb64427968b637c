import assert from 'node:assert/strict';
import { product } from '#server/db/in-practice.ts';
import { Replay } from '#server/features/replays/replay.entity.ts';
import { post } from './post.ts';
import { quiet } from './quiet.ts';
import { coveredClip } from './replay.ts';
import type { Task } from './task.ts';

/** A replay whose head is hidden is made, and another one ends: one copy comes, one goes. */
export const hiddenHead: Task = {
  name: 'hidden head',
  within: 1200,
  prepare: async (place) => {
    const { newLink } = await coveredClip(place);
    const old = await newLink();
    await quiet(place);
    let made = '';
    return {
      act: async () => {
        made = await newLink();
        await post(place, `/api/replays/${old}/revoke`, {});
      },
      kept: async () => {
        const copies = await place.inPractice(product(place.practiceId), async ({ em }) => {
          const rows = await em.find(Replay, { id: [made, old] });
          return new Map(rows.map(({ id, hiddenHead }) => [id, Boolean(hiddenHead)]));
        });
        assert.equal(copies.get(made), true, 'the copy of the new link is there');
        assert.equal(copies.get(old), false, 'the copy of the ended link is gone');
      },
    };
  },
};

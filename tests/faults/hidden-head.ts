import assert from 'node:assert/strict';
import { product } from '#server/db/in-practice.ts';
import { Replay } from '#server/features/replays/replay.entity.ts';
import { patiently } from './client.ts';
import { quiet } from './quiet.ts';
import type { Task } from './task.ts';
import { sendClip } from './upload.ts';

/** A replay whose head is hidden is made, and another one ends: one copy comes, one goes. */
export const hiddenHead: Task = {
  name: 'hidden head',
  within: 1200,
  prepare: async (place) => {
    const { visit } = await place.newVisit();
    const clip = await sendClip(place, visit.id);
    await quiet(place);
    const post = async (path: string, json: object): Promise<Record<string, unknown>> => {
      const { status, body } = await patiently(() => place.ask('POST', path, { json }));
      assert.ok(status < 300, `${path}: ${JSON.stringify(body)}`);
      return body;
    };
    await post(`/api/visits/${visit.id}/sides/right/call`, { seen: 'early', confidence: 'sure' });
    const span = { startFrame: 0, endFrame: 20 };
    const rep = await post(`/api/clips/${clip}/reps`, { supportSide: 'right', ...span });
    const box = { left: 10, top: 10, width: 30, height: 30 };
    await post(`/api/clips/${clip}/head`, {
      after: 0,
      fromFrame: 0,
      toFrame: 20,
      drawn: Array.from({ length: 21 }, (_, frame) => ({ frame, box })),
      followed: [],
    });
    await post(`/api/clips/${clip}/head/looked`, { version: 1 });
    const make = async (): Promise<string> => {
      const body = { visitId: visit.id, repId: rep.id, side: 'right', hideHead: true };
      const { replay } = await post('/api/replays', body);
      return (replay as { id: string }).id;
    };
    const old = await make();
    await quiet(place);
    let made = '';
    return {
      act: async () => {
        made = await make();
        await post(`/api/replays/${old}/revoke`, {});
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

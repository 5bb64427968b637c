import { afterAll, beforeAll, expect, it } from 'vitest';
import type { Waiting } from '#shared/contracts/today.ts';
import { type Api, startApi } from '#tests/support/api.ts';
import { makePlanCase } from '#tests/support/plan-cases.ts';
import { Replay } from '../replays/replay.entity.ts';

let api: Api;
beforeAll(async () => {
  api = await startApi();
});
afterAll(() => api.close());

it('lets a reading go once a plan was made from its side', async () => {
  const { visitId, side } = await makePlanCase(api, { reading: { code: 'early-turn-out' } });
  await api.ground.inPractice(api.world.coach, ({ em }) =>
    em.nativeDelete(Replay, { visit: visitId }),
  );
  const coach = await api.as(api.world.coach);
  const waits = async () =>
    ((await coach.get('/api/today').expect(200)).body.items as Waiting[]).some(
      (item) => item.kind === 'reading-ready' && item.visitId === visitId,
    );
  expect(await waits()).toBe(true);
  await coach.post(`/api/visits/${visitId}/sides/${side}/plan`).send({ from: 'call' }).expect(201);
  expect(await waits()).toBe(false);
});

import { afterAll, beforeAll, expect, it, vi } from 'vitest';
import type { EngineVersion } from '#shared/reading/engine.ts';
import { type Api, startApi } from '#tests/support/api.ts';
import { goldenClip } from '#tests/support/golden.ts';
import { markedTrial, moveFirstMark } from '#tests/support/marked-trial.ts';

const current = vi.hoisted((): { engine: EngineVersion } => ({ engine: 2 }));
vi.mock('#shared/reading/engine.ts', async (actual) => ({
  ...(await actual<object>()),
  get CURRENT_ENGINE() {
    return current.engine;
  },
}));

let api: Api;
beforeAll(async () => {
  api = await startApi();
});
afterAll(() => api.close());

it('a reading keeps the engine it was made by until asked anew; new marks are read by the new one', async () => {
  const coach = await api.as(api.world.coach);
  const golden = goldenClip('g01_early_big_thigh');
  const { side, clip } = await markedTrial(api, coach, golden);
  await coach.post(`${side}/call`).send({ seen: 'early', confidence: 'sure' }).expect(201);
  const page = async () => (await coach.get(`${side}/reading`).expect(200)).body;
  const first = await page();
  expect(first).toMatchObject({ reading: { result: { engine: 2 } }, newerEngine: null });

  current.engine = 3;
  const kept = await page();
  expect(kept.reading).toEqual(first.reading);
  expect(kept.newerEngine).toBe(3);
  expect(kept.history).toHaveLength(1);

  const renewed = (await coach.post(`${side}/reading`).expect(200)).body;
  expect(renewed).toMatchObject({ reading: { result: { engine: 3 } }, newerEngine: null });
  expect(renewed.history.map(({ engine }: { engine: number }) => engine)).toEqual([3, 2]);

  // a reading of other marks is a new one
  current.engine = 1;
  expect((await page()).newerEngine).toBe(1);
  await moveFirstMark(coach, clip, golden);
  expect(await page()).toMatchObject({ reading: { result: { engine: 1 } }, newerEngine: null });
});

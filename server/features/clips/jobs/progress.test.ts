import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest';
import { type Api, startApi } from '#tests/support/api.ts';
import { product } from '../../../db/in-practice.ts';
import { makeClip } from '../clip.factory.ts';
import { tellProgress } from './tell-progress.ts';

let api: Api;
beforeAll(async () => {
  api = await startApi();
});
afterAll(() => api.close());

describe('progress', () => {
  it('is kept and shown, and is no edit that others would be in conflict with', async () => {
    const { coach, visit, practiceId } = api.world;
    const { id } = await api.ground.inPractice(product(practiceId), ({ em }) =>
      Promise.resolve(makeClip(em, { visit, uploadedBy: coach, state: 'preparing', progress: 0 })),
    );
    const agent = await api.as(coach);
    const before = (await agent.get(`/api/clips/${id}`)).body as { version: number };
    tellProgress(api.ground, practiceId, id)({ stage: 'copying', percent: 40, secondsLeft: 12 });
    await vi.waitFor(
      async () => {
        const { body } = await agent.get(`/api/clips/${id}`);
        expect(body).toMatchObject({ progress: 40, secondsLeft: 12, version: before.version });
      },
      { timeout: 15_000 },
    );
    await agent
      .patch(`/api/clips/${id}`)
      .send({ version: before.version, mirrored: true })
      .expect(200);
  });
});

import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest';
import { type Api, startApi } from '#tests/support/api.ts';
import { PREPARE_CLIP } from '../../features/clips/jobs/prepare-clip-type.ts';
import { handles } from '../../jobs/job.ts';
import { startWorker, type Worker } from '../../jobs/worker.ts';
import { product } from '../in-practice.ts';
import { GREYWATER } from './accounts.ts';
import { fillDemoJob } from './fill-demo.job.ts';
import { GREYWATER_STORY } from './greywater-story.ts';
import { seedPractice } from './seed-practice.ts';
import { clipsOf } from './story.ts';

/** Clips in the order in which their preparation began; the first one lasts until it is let go. */
const begun: string[] = [];
let letGo: () => void = () => undefined;
const released = new Promise<void>((resolve) => {
  letGo = resolve;
});
const prepareInOrder = handles({
  type: PREPARE_CLIP,
  lockKey: ({ clipId }) => clipId,
  expireInMinutes: 1,
  retryLimit: 0,
  run: async ({ payload: { clipId } }) => {
    begun.push(clipId);
    await released;
  },
});

let api: Api;
let worker: Worker;
beforeAll(async () => {
  api = await startApi();
  await seedPractice(api.ground, GREYWATER_STORY, 'marsh and mud');
  worker = await startWorker(api.ground, [prepareInOrder, fillDemoJob], () => undefined);
});
afterAll(async () => {
  letGo();
  await worker.stop();
  await api.close();
});

const inQueue = async (practiceId: string): Promise<number> => {
  const [row] = await api.ground.inPractice(product(practiceId), ({ em }) =>
    em.execute<{ sent: number }[]>(
      'select count(*)::int as sent from job_outbox where queue = ? and sent_at is not null',
      [PREPARE_CLIP.queue],
    ),
  );
  return row?.sent ?? 0;
};
const patience = { timeout: 60_000, interval: 100 };

describe('while the demo is being made', () => {
  it('a person’s own clip, sent last of all, is prepared next', { timeout: 130_000 }, async () => {
    const demoClips = clipsOf(GREYWATER_STORY).length;
    await vi.waitFor(async () => {
      expect(await inQueue(GREYWATER)).toBe(demoClips);
      expect(begun).toHaveLength(1);
    }, patience);
    const coach = await api.as(api.world.coach);
    const { body: own } = await coach
      .post(`/api/visits/${api.world.visit.id}/clips`)
      .field('view', 'front')
      .attach('clip', Buffer.from('a film of somebody'), 'own.mp4')
      .expect(201);
    await vi.waitFor(async () => {
      expect(await inQueue(api.world.practiceId)).toBe(1);
    }, patience);
    letGo();
    await vi.waitFor(() => {
      expect(begun).toHaveLength(demoClips + 1);
    }, patience);
    expect(begun.indexOf(own.id as string)).toBe(1);
  });
});

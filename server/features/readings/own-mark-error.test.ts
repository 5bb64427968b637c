import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type Api, startApi } from '#tests/support/api.ts';
import { moveFirstMark } from '#tests/support/marked-trial.ts';
import {
  type Agent,
  askAgain,
  markAllAgain,
  pointsOf,
  trialToMarkAgain,
} from '#tests/support/second-marking.ts';

let api: Api;
let coach: Agent;
let supervisor: Agent;
beforeAll(async () => {
  api = await startApi();
  coach = await api.as(api.world.coach);
  supervisor = await api.as(api.world.supervisor);
});
afterAll(() => api.close());

describe('the marking error of a reading', () => {
  it('is the coach’s own from twenty frames marked twice on; the old reading stays until asked anew', async () => {
    const { side, reps, golden, clip } = await trialToMarkAgain(api, coach);
    const owner = await api.as(api.world.owner);
    await coach.post(`${side}/call`).send({ seen: 'early', confidence: 'sure' }).expect(201);
    const before = (await coach.get(`${side}/reading`).expect(200)).body;
    expect(before.reading.markError).toEqual({ px: 3, frames: 0 });
    expect(before.newerMarkError).toBeNull();
    for (const [index, rep] of reps.slice(0, 2).entries()) {
      const id = await askAgain(coach, rep.id);
      await markAllAgain(coach, id, pointsOf(golden.reps[index]?.commands), 1);
      await coach.post(`/api/second-markings/${id}/finish`).expect(200);
    }
    const own = (await coach.get('/api/reliability').expect(200)).body.people[0];
    expect(own).toMatchObject({ frames: 20, fromFrames: 20 });
    expect(own.px).toBeCloseTo(Math.SQRT1_2, 6);
    const kept = (await coach.get(`${side}/reading`).expect(200)).body;
    expect(kept.reading.id).toBe(before.reading.id);
    expect(kept.newerMarkError).toEqual({ px: own.px, frames: own.fromFrames });
    const bench = (await coach.get(`/api/clips/${clip.id}/bench`).expect(200)).body;
    expect(bench.markErrors).toContainEqual({
      side: golden.trial.supportSide,
      px: own.px,
      frames: own.fromFrames,
    });
    expect((await supervisor.post(`${side}/reading`)).status).toBe(403);
    const renewed = (await owner.post(`${side}/reading`).expect(200)).body;
    expect(renewed.reading.markError).toEqual({ px: own.px, frames: own.fromFrames });
    expect(renewed.reading.id).not.toBe(before.reading.id);
    expect(renewed.reading.plusMinus).toBeLessThan(before.reading.plusMinus);
    expect(renewed.newerMarkError).toBeNull();
    expect(renewed.history.map(({ markError }: { markError: object }) => markError)).toEqual([
      { px: own.px, frames: own.fromFrames },
      { px: 3, frames: 0 },
    ]);
    // a mark moved afterwards makes a new reading, which takes the own error by itself
    await moveFirstMark(coach, clip, golden, 2);
    const after = (await coach.get(`${side}/reading`).expect(200)).body;
    expect(after.reading.markError.frames).toBe(own.fromFrames);
    expect(after.history).toHaveLength(3);
  });
});

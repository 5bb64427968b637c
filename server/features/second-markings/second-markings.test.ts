import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type Api, startApi } from '#tests/support/api.ts';
import {
  type Agent,
  askAgain,
  commandsBeside,
  markAllAgain,
  openAgain,
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

/** Every number in an answer, however deep. */
const numbersIn = (value: unknown): number[] => {
  if (typeof value === 'number') return [value];
  if (typeof value !== 'object' || value === null) return [];
  return Object.values(value).flatMap(numbersIn);
};

describe('a second marking', () => {
  it('asks for ten frames in an order that stays, with the landmarks placed by hand', async () => {
    const { repId, golden } = await trialToMarkAgain(api, coach);
    const id = await askAgain(coach, repId);
    const one = await openAgain(coach, id);
    expect(one.frames).toHaveLength(10);
    expect((await openAgain(coach, id)).frames).toEqual(one.frames);
    const first = pointsOf(golden.reps[0]?.commands);
    for (const { frame, landmarks } of one.frames) {
      expect(landmarks.length).toBeGreaterThan(0);
      for (const landmark of landmarks) expect(first.has(`${frame} ${landmark}`)).toBe(true);
    }
    expect(one.summary).toMatchObject({ mine: true, frames: 10, framesDone: 0, finishedAt: null });
    expect(one.summary.openedAt).not.toBeNull();
  });

  it('never tells a coordinate of the first marks, nor anything that follows from them', async () => {
    const { repId, golden } = await trialToMarkAgain(api, coach);
    const id = await askAgain(coach, repId);
    const secret = new Set(
      golden.reps.flatMap(({ commands }) =>
        commands.flatMap(({ set }) =>
          set.to === 'point' ? [set.u, set.v].filter((n) => !Number.isInteger(n)) : [],
        ),
      ),
    );
    expect(secret.size).toBeGreaterThan(100);
    const first = pointsOf(golden.reps[0]?.commands);
    const document = await openAgain(coach, id);
    const [command] = commandsBeside(document, first, 0.123456);
    const base = `/api/second-markings/${id}`;
    const answers = [
      document,
      (await coach.get(`/api/reps/${repId}/second-markings`).expect(200)).body,
      (
        await coach
          .post(`${base}/marks`)
          .send({ commands: [command] })
          .expect(200)
      ).body,
      (
        await coach
          .post(`${base}/marks`)
          .send({ commands: [command] })
          .expect(200)
      ).body,
      (
        await coach
          .post(`${base}/marks`)
          .send({ commands: [{ ...command, id: randomUUID() }] })
          .expect(200)
      ).body,
      (await coach.post(`${base}/finish`).expect(409)).body,
      await openAgain(coach, id),
      (await coach.get('/api/reliability').expect(200)).body,
    ];
    for (const answer of answers) {
      expect(numbersIn(answer).filter((n) => secret.has(n))).toEqual([]);
      expect(JSON.stringify(answer)).not.toMatch(/boundar|phase|quiet|"lift"|"turn"/);
    }
  });

  it('takes frames that the coach chose, and none that nobody has marked', async () => {
    const { repId, golden, reps } = await trialToMarkAgain(api, coach);
    const frames = golden.reps[0]?.commands.map(({ frame }) => frame) ?? [];
    const chosen = [...new Set(frames)].slice(0, 4);
    const { frames: asked } = await openAgain(
      coach,
      await askAgain(coach, repId, { frames: chosen }),
    );
    expect(asked.map(({ frame }) => frame).sort((a, b) => a - b)).toEqual(chosen);
    const unmarked = Array.from({ length: 300 }, (_, frame) => frame).find(
      (frame) => !golden.reps[1]?.commands.some((command) => command.frame === frame),
    );
    const none = await coach
      .post(`/api/reps/${reps[1]?.id}/second-markings`)
      .send({ frames: [unmarked] });
    expect(none.status).toBe(409);
    expect(none.body.code).toBe('nothing-to-mark-again');
  });

  it('does a command once, and answers what is newer with a conflict', async () => {
    const { repId, golden } = await trialToMarkAgain(api, coach);
    const id = await askAgain(coach, repId);
    const first = pointsOf(golden.reps[0]?.commands);
    const [command] = commandsBeside(await openAgain(coach, id), first, 1);
    const save = (commands: unknown[]) =>
      coach.post(`/api/second-markings/${id}/marks`).send({ commands });
    const outcomeOf = async (commands: unknown[]) =>
      (await save(commands).expect(200)).body.outcomes[0].outcome;
    expect(await outcomeOf([command])).toBe('applied');
    expect(await outcomeOf([command])).toBe('already-applied');
    expect(await outcomeOf([{ ...command, id: randomUUID() }])).toBe('conflict');
    const removed = { ...command, id: randomUUID(), baseRevision: 1, set: { to: 'none' } };
    expect(await outcomeOf([removed])).toBe('applied');
    expect((await openAgain(coach, id)).marks).toEqual([]);
    const stray = await save([{ ...command, id: randomUUID(), frame: 299 }]);
    expect(stray.status).toBe(422);
    expect(stray.body.code).toBe('not-asked-here');
  });

  it('is for its marker alone until it is finished, and then for all who see the athlete', async () => {
    const { repId, golden } = await trialToMarkAgain(api, coach);
    const { world } = api;
    const id = await askAgain(supervisor, repId, { markerId: world.coach.id });
    const closed = await supervisor.get(`/api/second-markings/${id}`);
    expect(closed.status).toBe(403);
    expect((await supervisor.post(`/api/second-markings/${id}/finish`)).status).toBe(403);
    const otherCoach = await api.as(world.otherCoach);
    expect((await otherCoach.get(`/api/second-markings/${id}`)).status).toBe(404);
    const first = pointsOf(golden.reps[0]?.commands);
    await markAllAgain(coach, id, first);
    await coach.post(`/api/second-markings/${id}/finish`).expect(200);
    const seen = await openAgain(supervisor, id);
    expect(seen.agreement?.repeat.frames).toBe(10);
    expect(seen.summary.mine).toBe(false);
  });

  it('is asked of nobody who may not see the athlete, and once at a time', async () => {
    const { repId } = await trialToMarkAgain(api, coach);
    const { world } = api;
    for (const markerId of [world.otherCoach.id, world.foreignCoach.id]) {
      const refused = await coach.post(`/api/reps/${repId}/second-markings`).send({ markerId });
      expect(refused.body.code).toBe('marker-cannot-see');
    }
    await askAgain(coach, repId);
    const twice = await coach.post(`/api/reps/${repId}/second-markings`).send({});
    expect(twice.body.code).toBe('second-marking-open');
    const list = await supervisor.get(`/api/reps/${repId}/second-markings`).expect(200);
    const names = list.body.people.map(({ id }: { id: string }) => id);
    expect(names.sort()).toEqual([world.coach.id, world.owner.id, world.supervisor.id].sort());
    expect(list.body.items).toHaveLength(1);
    // who is asked by another finds it among what waits
    const asked = await askAgain(coach, repId, { markerId: world.supervisor.id });
    const waits = (await supervisor.get('/api/reliability').expect(200)).body.waiting;
    expect(waits.map(({ summary }: { summary: { id: string } }) => summary.id)).toEqual([asked]);
    await supervisor.delete(`/api/second-markings/${asked}`).expect(204);
  });

  it('says at its end how well the marks repeat, and stays as it is', async () => {
    const { repId, golden } = await trialToMarkAgain(api, coach);
    const id = await askAgain(coach, repId);
    const first = pointsOf(golden.reps[0]?.commands);
    const [command] = await markAllAgain(coach, id, first, 2);
    const finished = await coach.post(`/api/second-markings/${id}/finish`).expect(200);
    // every coordinate 2 px beside the first: √(4/2)
    expect(finished.body.agreement.repeat.px).toBeCloseTo(Math.SQRT2, 6);
    const k = golden.geometry.scale?.from === 'typed' ? golden.geometry.scale.mmPerPx : NaN;
    expect(finished.body.agreement.repeat.mm).toBeCloseTo(k * Math.SQRT2, 6);
    expect(finished.body.agreement.firstBy).toMatchObject([{ id: api.world.coach.id }]);
    expect(finished.body.agreement.readings).toMatchObject({ first: expect.any(String) });
    const base = `/api/second-markings/${id}`;
    const late = await coach.post(`${base}/marks`).send({ commands: [command] });
    expect(late.body.code).toBe('second-marking-finished');
    expect((await coach.delete(base)).body.code).toBe('second-marking-finished');
    const same = await coach.post(`${base}/finish`).expect(200);
    expect(same.body).toEqual(finished.body);
  });

  it('that is given up leaves nothing', async () => {
    const { repId, golden } = await trialToMarkAgain(api, coach);
    const id = await askAgain(coach, repId);
    await markAllAgain(coach, id, pointsOf(golden.reps[0]?.commands));
    await coach.delete(`/api/second-markings/${id}`).expect(204);
    expect((await coach.get(`/api/second-markings/${id}`)).status).toBe(404);
    await askAgain(coach, repId);
  });
});

describe('reliability', () => {
  it('is a coach’s own, those of assigned coaches to a supervisor, and all to an owner', async () => {
    const { world } = api;
    const of = async (user: typeof world.coach) =>
      (await (await api.as(user)).get('/api/reliability').expect(200)).body;
    const ids = (body: { people: { person: { id: string } }[] }) =>
      body.people.map(({ person }) => person.id).sort();
    expect(ids(await of(world.coach))).toEqual([world.coach.id]);
    expect(ids(await of(world.supervisor))).toEqual([world.coach.id, world.supervisor.id].sort());
    expect(ids(await of(world.owner))).toEqual(
      [world.coach.id, world.otherCoach.id, world.supervisor.id, world.owner.id].sort(),
    );
    const stranger = await of(world.otherCoach);
    expect(ids(stranger)).toEqual([world.otherCoach.id]);
    expect(stranger).toMatchObject({ repeats: [], between: [], practice: null, calls: [] });
    const foreign = await of(world.foreignOwner);
    expect(foreign.repeats).toEqual([]);
    expect(JSON.stringify(foreign)).not.toContain(world.coach.id);
  });

  it('gives lift and turn at the frames marked twice, and which landmark repeats worst', async () => {
    const { repId, golden } = await trialToMarkAgain(api, coach);
    const id = await askAgain(supervisor, repId);
    const first = pointsOf(golden.reps[0]?.commands);
    const commands = commandsBeside(await openAgain(supervisor, id), first, 1).map((command) =>
      command.landmark === 'lifted-knee' && 'u' in command.set && command.set.u !== undefined
        ? { ...command, set: { ...command.set, u: command.set.u + 8 } }
        : command,
    );
    await supervisor.post(`/api/second-markings/${id}/marks`).send({ commands }).expect(200);
    await supervisor.post(`/api/second-markings/${id}/finish`).expect(200);
    const { body } = await coach.get('/api/reliability').expect(200);
    const [pair] = body.between;
    expect(pair.first.id).toBe(api.world.coach.id);
    expect(pair.second.id).toBe(api.world.supervisor.id);
    expect(pair.repeat.landmarks[0].landmark).toBe('lifted-knee');
    expect(pair.repeat.landmarks[0].px).toBeCloseTo(Math.sqrt((81 + 1) / 4), 6);
    expect(pair.lift.pairs).toBe(10);
    expect(pair.turn.pairs).toBe(7);
    expect(pair.turn.points).toHaveLength(7);
    expect(pair.turn.random.value).toBeGreaterThan(0.5);
    expect(pair.turn.limits.low).toBeLessThan(pair.turn.limits.high);
    expect(pair.readings).toMatchObject({ pairs: 1, kappa: null, why: 'too-few' });
  });
});

import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import type { MarkCommand } from '#shared/contracts/reps.ts';
import { type Api, startApi } from '#tests/support/api.ts';
import type { Clip } from '../clips/clip.entity.ts';
import { makeClip } from '../clips/clip.factory.ts';

let api: Api;
let clip: Clip;
type Agent = Awaited<ReturnType<Api['as']>>;
let coach: Agent;

beforeAll(async () => {
  api = await startApi();
  coach = await api.as(api.world.coach);
});
afterAll(() => api.close());
beforeEach(async () => {
  const { coach: user, visit } = api.world;
  clip = await api.ground.inPractice(user, ({ em }) =>
    Promise.resolve(makeClip(em, { visit, uploadedBy: user })),
  );
});

const addRep = async (body: object = {}): Promise<{ id: string; version: number }> => {
  const answer = await coach
    .post(`/api/clips/${clip.id}/reps`)
    .send({ supportSide: 'right', startFrame: 10, endFrame: 400, ...body })
    .expect(201);
  return answer.body;
};

const command = (given: Partial<MarkCommand> = {}): MarkCommand => ({
  id: randomUUID(),
  frame: 20,
  landmark: 'kneecap',
  baseRevision: 0,
  set: {
    to: 'point',
    u: 500.25,
    v: 900.5,
    source: 'hand',
    looked: true,
    confidence: null,
    pictureLongEdge: 1920,
  },
  ...given,
});

describe('reps', () => {
  it('are numbered by where they start, each with its own support side and view', async () => {
    await addRep({ startFrame: 300, endFrame: 500, supportSide: 'left' });
    await addRep({ startFrame: 0, endFrame: 250 });
    const { body } = await coach.get(`/api/clips/${clip.id}/reps`).expect(200);
    expect(body.items).toMatchObject([
      { number: 1, startFrame: 0, supportSide: 'right', view: 'front', markedFrames: 0 },
      { number: 2, startFrame: 300, supportSide: 'left', view: 'front', markedFrames: 0 },
    ]);
  });

  it('lie inside the clip', async () => {
    const answer = await coach
      .post(`/api/clips/${clip.id}/reps`)
      .send({ supportSide: 'right', startFrame: 0, endFrame: 600 });
    expect(answer.status).toBe(422);
    expect(answer.body).toMatchObject({ code: 'frame-out-of-range' });
    expect(answer.body.detail).toContain('0 to 599');
  });

  it('keep a moment moved by hand, give it back, and refuse one out of order', async () => {
    const rep = await addRep();
    const edit = (body: object) => coach.patch(`/api/reps/${rep.id}`).send(body);
    const moved = await edit({ version: 1, boundaries: { footOff: 60, top: 200 } }).expect(200);
    expect(moved.body.boundaries.top).toEqual({ frame: 200, by: 'hand' });
    const wrong = await edit({ version: 2, boundaries: { footOff: 250 } });
    expect(wrong.status).toBe(422);
    expect(wrong.body.code).toBe('boundaries-out-of-order');
    const back = await edit({ version: 2, boundaries: { top: null } }).expect(200);
    expect(back.body.boundaries).toMatchObject({ top: null, footOff: { frame: 60, by: 'hand' } });
  });

  it('are left out with a reason and stay visible', async () => {
    const rep = await addRep();
    await coach
      .patch(`/api/reps/${rep.id}`)
      .send({ version: 1, excluded: 'hopped', excludedNote: 'twice' })
      .expect(200);
    const { body } = await coach.get(`/api/clips/${clip.id}/reps`);
    expect(body.items).toMatchObject([{ excluded: 'hopped', excludedNote: 'twice' }]);
  });

  it('are not overwritten by an edit of an older version', async () => {
    const rep = await addRep();
    await coach.patch(`/api/reps/${rep.id}`).send({ version: 1, endFrame: 390 }).expect(200);
    const late = await coach.patch(`/api/reps/${rep.id}`).send({ version: 1, endFrame: 380 });
    expect(late.status).toBe(409);
    expect(late.body.code).toBe('edited-meanwhile');
  });

  it('are deleted with their marks', async () => {
    const rep = await addRep();
    await coach
      .post(`/api/reps/${rep.id}/marks`)
      .send({ commands: [command()] })
      .expect(200);
    await coach.delete(`/api/reps/${rep.id}`).expect(204);
    await coach.get(`/api/reps/${rep.id}/marks`).expect(404);
    const left = await api.ground.inPractice(api.world.coach, ({ em }) =>
      em.execute<{ n: number }[]>('select count(*)::int as n from mark where rep_id = ?', [rep.id]),
    );
    expect(left).toEqual([{ n: 0 }]);
  });
});

describe('marks', () => {
  it('are kept to the last digit, with who placed them', async () => {
    const rep = await addRep();
    const first = command();
    const { body } = await coach
      .post(`/api/reps/${rep.id}/marks`)
      .send({ commands: [first] })
      .expect(200);
    expect(body.outcomes).toMatchObject([{ id: first.id, outcome: 'applied', revision: 1 }]);
    expect(body.rep.markedFrames).toBe(1);
    const stored = await coach.get(`/api/reps/${rep.id}/marks`).expect(200);
    expect(stored.body.items).toMatchObject([
      { frame: 20, landmark: 'kneecap', u: 500.25, v: 900.5, by: { name: api.world.coach.name } },
    ]);
  });

  it('do nothing when the same command comes again', async () => {
    const rep = await addRep();
    const first = command();
    const send = () => coach.post(`/api/reps/${rep.id}/marks`).send({ commands: [first] });
    await send().expect(200);
    const again = await send().expect(200);
    expect(again.body.outcomes).toMatchObject([
      { outcome: 'already-applied', revision: 1, mark: { u: 500.25 } },
    ]);
  });

  it('answer a conflict with what is stored and change nothing', async () => {
    const rep = await addRep();
    await coach
      .post(`/api/reps/${rep.id}/marks`)
      .send({ commands: [command()] })
      .expect(200);
    const late = command({ set: { to: 'hidden' } });
    const { body } = await coach
      .post(`/api/reps/${rep.id}/marks`)
      .send({ commands: [late] })
      .expect(200);
    expect(body.outcomes).toMatchObject([
      { outcome: 'conflict', revision: 1, mark: { u: 500.25, hidden: false } },
    ]);
  });

  it('go on counting when a mark is removed and placed again', async () => {
    const rep = await addRep();
    const { body } = await coach.post(`/api/reps/${rep.id}/marks`).send({
      commands: [
        command(),
        command({ baseRevision: 1, set: { to: 'none' } }),
        command({ baseRevision: 2, set: { to: 'hidden' } }),
      ],
    });
    expect(body.outcomes.map((each: { revision: number }) => each.revision)).toEqual([1, 2, 3]);
    const stored = await coach.get(`/api/reps/${rep.id}/marks`);
    expect(stored.body.items).toMatchObject([{ hidden: true, u: null, revision: 3 }]);
  });

  it('refuse a landmark that this view does not show, and say which', async () => {
    const rep = await addRep();
    const answer = await coach
      .post(`/api/reps/${rep.id}/marks`)
      .send({ commands: [command(), command({ landmark: 'trochanter' })] });
    expect(answer.status).toBe(422);
    expect(answer.body).toMatchObject({ code: 'landmark-not-in-view' });
    const stored = await coach.get(`/api/reps/${rep.id}/marks`);
    expect(stored.body.items).toEqual([]);
  });

  it('take thousands at once', async () => {
    const rep = await addRep();
    const five = ['kneecap', 'knee-inner', 'knee-outer', 'belt-tip', 'thigh-tip'];
    const commands = five.flatMap((landmark) =>
      Array.from({ length: 600 }, (_, frame) => command({ frame, landmark })),
    );
    const { body } = await coach.post(`/api/reps/${rep.id}/marks`).send({ commands }).expect(200);
    expect(body.outcomes).toHaveLength(3000);
    expect(body.rep.markedFrames).toBe(600);
  });
});

describe('a quiet stance that reps share', () => {
  const quietFrom = (rep: { id: string; version: number }, lender: string | null) =>
    coach.patch(`/api/reps/${rep.id}`).send({ version: rep.version, quietFrom: lender });

  it('is taken from another rep of the clip and side, given back, and ends with its lender', async () => {
    const lender = await addRep({ startFrame: 0, endFrame: 100 });
    const rep = await addRep({ startFrame: 101, endFrame: 200 });
    const taken = await quietFrom(rep, lender.id).expect(200);
    expect(taken.body.quietFrom).toBe(lender.id);
    const back = await quietFrom(taken.body, null).expect(200);
    expect(back.body.quietFrom).toBeNull();
    await quietFrom(back.body, lender.id).expect(200);
    await coach.delete(`/api/reps/${lender.id}`).expect(204);
    const { body } = await coach.get(`/api/clips/${clip.id}/reps`).expect(200);
    expect(body.items).toMatchObject([{ id: rep.id, quietFrom: null }]);
  });

  it('is not taken from the other side, from itself, or from a rep that takes one itself', async () => {
    const rep = await addRep({ startFrame: 101, endFrame: 200 });
    const other = await addRep({ startFrame: 0, endFrame: 100, supportSide: 'left' });
    const first = await addRep({ startFrame: 201, endFrame: 300 });
    const second = await addRep({ startFrame: 301, endFrame: 400 });
    await quietFrom(second, first.id).expect(200);
    for (const lender of [other.id, rep.id, second.id, randomUUID()]) {
      const { body } = await quietFrom(rep, lender).expect(422);
      expect(body.faults[0].path).toBe('body.quietFrom');
    }
  });
});

describe('whoever may not', () => {
  it('gets 404 for another caseload and another practice, 403 for a supervisor who only reads', async () => {
    const rep = await addRep();
    for (const user of [api.world.otherCoach, api.world.foreignCoach, api.world.foreignOwner]) {
      const stranger = await api.as(user);
      await stranger.get(`/api/clips/${clip.id}/reps`).expect(404);
      await stranger.get(`/api/clips/${clip.id}/bench`).expect(404);
      await stranger.get(`/api/reps/${rep.id}/marks`).expect(404);
      await stranger.patch(`/api/reps/${rep.id}`).send({ version: 1, endFrame: 390 }).expect(404);
      await stranger
        .post(`/api/reps/${rep.id}/marks`)
        .send({ commands: [command()] })
        .expect(404);
      await stranger.delete(`/api/reps/${rep.id}`).expect(404);
    }
    const supervisor = await api.as(api.world.supervisor);
    await supervisor.get(`/api/reps/${rep.id}/marks`).expect(200);
    await supervisor
      .post(`/api/reps/${rep.id}/marks`)
      .send({ commands: [command()] })
      .expect(403);
    await api.nobody.get(`/api/reps/${rep.id}/marks`).expect(401);
  });
});

describe('the Bench', () => {
  it('opens with one document of clip, reps, marks, comments and calls', async () => {
    const rep = await addRep();
    await coach
      .post(`/api/reps/${rep.id}/marks`)
      .send({ commands: [command()] })
      .expect(200);
    await coach
      .post(`/api/clips/${clip.id}/comments`)
      .send({
        body: 'Is the heel down?',
        fromFrame: 20,
        toFrame: 20,
        shape: { kind: 'ring', u: 5, v: 6, radius: 40 },
      })
      .expect(201);
    const { body } = await coach.get(`/api/clips/${clip.id}/bench`).expect(200);
    expect(body).toMatchObject({
      clip: { id: clip.id, frames: { count: 600 }, mmPerPx: 1 },
      reps: [{ rep: { id: rep.id, number: 1 }, marks: [{ landmark: 'kneecap' }] }],
      comments: [{ body: 'Is the heel down?', mine: true }],
      may: { mark: true, comment: true },
    });
  });
});

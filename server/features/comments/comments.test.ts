import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { type Api, startApi } from '#tests/support/api.ts';
import type { Clip } from '../clips/clip.entity.ts';
import { makeClip } from '../clips/clip.factory.ts';

let api: Api;
let clip: Clip;
let coach: Awaited<ReturnType<Api['as']>>;
let supervisor: Awaited<ReturnType<Api['as']>>;

beforeAll(async () => {
  api = await startApi();
  coach = await api.as(api.world.coach);
  supervisor = await api.as(api.world.supervisor);
});
afterAll(() => api.close());
beforeEach(async () => {
  const { coach: user, visit } = api.world;
  clip = await api.ground.inPractice(user, ({ em }) =>
    Promise.resolve(makeClip(em, { visit, uploadedBy: user })),
  );
});

const say = async (who: typeof coach, body: object) => {
  const answer = await who
    .post(`/api/clips/${clip.id}/comments`)
    .send({ body: 'Look at the heel.', fromFrame: 100, toFrame: 130, ...body })
    .expect(201);
  return answer.body as { id: string };
};

describe('comments', () => {
  it('stand at a span, with an answer behind them at the same moment', async () => {
    const question = await say(supervisor, { shape: { kind: 'point', u: 400.5, v: 1700 } });
    await say(coach, { body: 'It is down.', answerTo: question.id, fromFrame: 0, toFrame: 0 });
    const { body } = await coach.get(`/api/clips/${clip.id}/comments`).expect(200);
    expect(body.items).toMatchObject([
      { body: 'Look at the heel.', shape: { kind: 'point', u: 400.5 }, mine: false, toFrame: 130 },
      { body: 'It is down.', answerTo: question.id, fromFrame: 100, mine: true },
    ]);
  });

  it('are resolved and opened again by whoever may read them', async () => {
    const question = await say(supervisor, {});
    const resolved = await coach
      .patch(`/api/comments/${question.id}`)
      .send({ resolved: true })
      .expect(200);
    expect(resolved.body.resolved.by.id).toBe(api.world.coach.id);
    const open = await coach.patch(`/api/comments/${question.id}`).send({ resolved: false });
    expect(open.body.resolved).toBeNull();
  });

  it('are changed and taken back only by who wrote them, and not once answered', async () => {
    const mine = await say(coach, {});
    await supervisor.patch(`/api/comments/${mine.id}`).send({ body: 'Mine now.' }).expect(403);
    await supervisor.delete(`/api/comments/${mine.id}`).expect(403);
    const edited = await coach.patch(`/api/comments/${mine.id}`).send({ body: 'Left heel.' });
    expect(edited.body).toMatchObject({ body: 'Left heel.' });
    expect(edited.body.editedAt).not.toBeNull();
    await say(supervisor, { answerTo: mine.id });
    const late = await coach.delete(`/api/comments/${mine.id}`);
    expect(late.status).toBe(409);
    expect(late.body.detail).toContain('resolve it');
  });

  it('do not exist for another caseload or practice', async () => {
    const mine = await say(coach, {});
    for (const user of [api.world.otherCoach, api.world.foreignOwner]) {
      const stranger = await api.as(user);
      await stranger.get(`/api/clips/${clip.id}/comments`).expect(404);
      await stranger.patch(`/api/comments/${mine.id}`).send({ resolved: true }).expect(404);
      await stranger
        .post(`/api/clips/${clip.id}/comments`)
        .send({ body: 'x', fromFrame: 0, toFrame: 0 })
        .expect(404);
    }
  });

  it('point at what was drawn by hand, corner by corner', async () => {
    const points = [
      { u: 10, v: 20.5 },
      { u: 400, v: 900 },
      { u: 410.25, v: 1200 },
    ];
    await say(supervisor, { body: 'This line.', shape: { kind: 'stroke', points } });
    const { body } = await coach.get(`/api/clips/${clip.id}/comments`).expect(200);
    expect(body.items).toMatchObject([{ shape: { kind: 'stroke', points } }]);
    const short = { kind: 'stroke', points: points.slice(0, 1) };
    const long = { kind: 'stroke', points: Array.from({ length: 201 }, () => points[0]) };
    for (const shape of [short, long])
      await coach
        .post(`/api/clips/${clip.id}/comments`)
        .send({ body: 'x', fromFrame: 0, toFrame: 0, shape })
        .expect(422);
  });

  it('show an angle only as a listed measure of one frame', async () => {
    const shape = { kind: 'measure', measure: 'pelvic-obliquity' };
    await say(supervisor, { fromFrame: 100, toFrame: 100, shape });
    const { body } = await coach.get(`/api/clips/${clip.id}/comments`).expect(200);
    expect(body.items).toMatchObject([{ shape }]);
    const at = { body: 'x', fromFrame: 100, toFrame: 100 };
    for (const refused of [
      { ...at, shape, toFrame: 130 },
      { ...at, shape: { kind: 'measure', measure: 'knee-to-nose' } },
      { ...at, shape: { kind: 'measured', u: 1, v: 2, label: 'Lift', text: '74°' } },
    ])
      await coach.post(`/api/clips/${clip.id}/comments`).send(refused).expect(422);
  });

  it('lie inside the clip', async () => {
    const answer = await coach
      .post(`/api/clips/${clip.id}/comments`)
      .send({ body: 'Too late.', fromFrame: 10, toFrame: 600 });
    expect(answer.body).toMatchObject({ status: 422, code: 'frame-out-of-range' });
  });
});

import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { product } from '#server/db/in-practice.ts';
import { type Api, startApi } from '#tests/support/api.ts';
import { makeClip } from '../clips/clip.factory.ts';
import { makeVisit } from '../visits/visit.factory.ts';

let api: Api;
let coach: Awaited<ReturnType<Api['as']>>;
let clipId: string;
const path = () => `/api/clips/${clipId}/head`;

const box = { left: 500, top: 200, width: 120, height: 150 };
const followed = Array.from({ length: 599 }, (_, n) => ({
  frame: n + 1,
  box,
  confidence: n >= 99 && n < 120 ? 0.2 : 0.9,
}));
const body = (more: object = {}) => ({
  after: 0,
  fromFrame: 0,
  toFrame: 599,
  drawn: [{ frame: 0, box }],
  followed,
  ...more,
});

beforeAll(async () => {
  api = await startApi();
  coach = await api.as(api.world.coach);
});
afterAll(() => api.close());

/** A clip without a box: every test has its own. */
const freshClip = async () => {
  const { coach: user, athlete } = api.world;
  const clip = await api.ground.inPractice(user, ({ em }) => {
    const visit = makeVisit(em, { athlete, coach: user });
    return Promise.resolve(makeClip(em, { visit, uploadedBy: user }));
  });
  clipId = clip.id;
};

describe('the box around a head', () => {
  it('is nothing before it is drawn, and every version stands beside the ones before', async () => {
    await freshClip();
    expect((await coach.get(path()).expect(200)).body).toEqual({
      head: null,
      may: { save: true },
    });
    const first = await coach.post(path()).send(body()).expect(201);
    expect(first.body.head).toMatchObject({
      version: 1,
      growth: 0.05,
      lost: [{ from: 100, to: 120 }],
      uncovered: [],
      by: { id: api.world.coach.id },
      looked: null,
    });
    const second = await coach
      .post(path())
      .send(body({ after: 1, toFrame: 399, followed: followed.slice(0, 399) }))
      .expect(201);
    expect(second.body.head).toMatchObject({
      version: 2,
      uncovered: [{ from: 400, to: 599 }],
    });
    const rows = await api.ground.inPractice(api.world.coach, ({ em }) =>
      em.execute<object[]>('select version from head where clip_id = ? order by version', [clipId]),
    );
    expect(rows).toEqual([{ version: 1 }, { version: 2 }]);
  });

  it('is not passed over by somebody who has not seen it', async () => {
    await freshClip();
    await coach.post(path()).send(body()).expect(201);
    const late = await coach.post(path()).send(body());
    expect(late.body).toMatchObject({ status: 409, code: 'edited-meanwhile' });
  });

  it('is looked at once, by version; another version has to be looked at anew', async () => {
    await freshClip();
    await coach.post(`${path()}/looked`).send({ version: 1 }).expect(404);
    await coach.post(path()).send(body()).expect(201);
    const looked = await coach.post(`${path()}/looked`).send({ version: 1 }).expect(200);
    expect(looked.body.head.looked).toMatchObject({ by: { id: api.world.coach.id } });
    const owner = await api.as(api.world.owner);
    const again = await owner.post(`${path()}/looked`).send({ version: 1 }).expect(200);
    expect(again.body.head.looked).toEqual(looked.body.head.looked);
    const changed = await coach
      .post(path())
      .send(body({ after: 1 }))
      .expect(201);
    expect(changed.body.head.looked).toBeNull();
    const late = await coach.post(`${path()}/looked`).send({ version: 1 });
    expect(late.body).toMatchObject({ status: 409, code: 'edited-meanwhile' });
  });

  it('says what cannot be used', async () => {
    await freshClip();
    const tiny = await coach
      .post(path())
      .send(body({ drawn: [{ frame: 0, box: { ...box, width: 4 } }] }));
    expect(tiny.body.faults).toMatchObject([{ path: 'body.drawn.0.box.width' }]);
    const none = await coach.post(path()).send(body({ drawn: [] }));
    expect(none.body.faults).toMatchObject([{ path: 'body.drawn' }]);
    const twice = await coach.post(path()).send(body({ followed: [followed[0], followed[0]] }));
    expect(twice.body.faults).toMatchObject([{ message: 'A frame has one box.' }]);
    const outside = await coach.post(path()).send(body({ toFrame: 600 }));
    expect(outside.body).toMatchObject({ status: 422, code: 'frame-out-of-range' });
  });

  it('is for those who work with the athlete; others of the practice may see it or find nothing', async () => {
    await freshClip();
    await coach.post(path()).send(body()).expect(201);
    for (const [user, read, write] of [
      [api.world.supervisor, 200, 403],
      [api.world.otherCoach, 404, 404],
      [api.world.foreignOwner, 404, 404],
    ] as const) {
      const who = await api.as(user);
      await who.get(path()).expect(read);
      await who
        .post(path())
        .send(body({ after: 1 }))
        .expect(write);
      await who.post(`${path()}/looked`).send({ version: 1 }).expect(write);
    }
    await api.nobody.get(path()).expect(401);
  });

  it('is only added to, and goes with its clip', async () => {
    await freshClip();
    await coach.post(path()).send(body()).expect(201);
    const here = product(api.world.practiceId);
    for (const sql of ['update head set growth = 0', 'delete from head'])
      await expect(api.ground.inPractice(here, ({ em }) => em.execute(sql))).rejects.toThrow(
        /permission denied/,
      );
    await coach.delete(`/api/clips/${clipId}`).expect(204);
    const rows = await api.ground.inPractice(here, ({ em }) =>
      em.execute<object[]>('select id from head where clip_id = ?', [clipId]),
    );
    expect(rows).toEqual([]);
  });
});

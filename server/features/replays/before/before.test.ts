import { Readable } from 'node:stream';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type Api, startApi } from '#tests/support/api.ts';
import { goldenClip } from '#tests/support/golden.ts';
import { markedTrial } from '#tests/support/marked-trial.ts';
import { makeConsent } from '../../athletes/athlete.factory.ts';
import { Clip } from '../../clips/clip.entity.ts';
import { hiddenFiles } from '../../clips/clip-files.ts';
import { Head } from '../../heads/head.entity.ts';
import { hideHeadJob } from '../jobs/hide-head.ts';
import { ReplayBefore } from './replay-before.entity.ts';

let api: Api;
let coach: Awaited<ReturnType<Api['as']>>;
const golden = goldenClip('g01_early_big_thigh');
const later = goldenClip('g04_expected_big');

interface Made {
  readonly visitId: string;
  readonly clipId: string;
  readonly repId: string;
}
let first: Made;
let now: Made;

const trial = async (of: typeof golden, day: string, called = true): Promise<Made> => {
  const { visit, clip, side } = await markedTrial(api, coach, of, day);
  if (called)
    await coach.post(`${side}/call`).send({ seen: 'early', confidence: 'sure' }).expect(201);
  const { body } = await coach.get(`/api/clips/${clip.id}/reps`).expect(200);
  return { visitId: visit.id, clipId: clip.id, repId: String(body.items[0]?.id) };
};

/** Something to be served, in place of a film. */
const put = (key: string, what: string) =>
  api.ground.storage.putStream(key, Readable.from([Buffer.from(what)]), 'video/mp4');
const filmOf = async ({ clipId }: Made, what: string) => {
  const { files } = await api.ground.inPractice(api.world.coach, ({ em }) =>
    em.findOneOrFail(Clip, { id: clipId }),
  );
  await put(String(files.replay), what);
};

beforeAll(async () => {
  api = await startApi();
  coach = await api.as(api.world.coach);
  const { coach: user, athlete } = api.world;
  await api.ground.inPractice(user, ({ em }) => {
    makeConsent(em, { athlete, recordedBy: user, purposes: ['assessment', 'sharing-by-link'] });
    return Promise.resolve();
  });
  first = await trial(golden, '2026-03-03');
  now = await trial(later, '2026-04-14');
  await coach
    .get(`/api/visits/${now.visitId}/sides/${later.trial.supportSide}/reading`)
    .expect(200);
  await filmOf(first, 'the earlier film');
  await filmOf(now, 'the film');
});
afterAll(() => api.close());

const ask = (more: object = {}, of: Made = now) =>
  coach.post('/api/replays').send({
    visitId: of.visitId,
    repId: of.repId,
    side: later.trial.supportSide,
    beforeVisitId: first.visitId,
    ...more,
  });
const make = async (more: object = {}) => {
  const { body } = await ask(more).expect(201);
  return { replay: body.replay, token: String(body.url).split('/r/')[1] ?? '' };
};
const open = (token: string) => api.nobody.get(`/api/r/${token}`);
const film = (token: string) => api.nobody.get(`/api/r/${token}/before/video`);
const drawHead = async (of: Made, after: number, looked = true) => {
  const { frames } = of === first ? golden : later;
  const box = { left: 20, top: 10, width: 40, height: 40 };
  const drawn = [{ frame: 0, box }];
  const toFrame = frames.count - 1;
  await coach
    .post(`/api/clips/${of.clipId}/head`)
    .send({ after, fromFrame: 0, toFrame, drawn, followed: [] })
    .expect(201);
  if (looked)
    await coach
      .post(`/api/clips/${of.clipId}/head/looked`)
      .send({ version: after + 1 })
      .expect(200);
};

describe('an earlier lift beside a replay', () => {
  it('comes with the moments at which both thighs are as high, to one frame’s step', async () => {
    const { token, replay } = await make();
    expect(replay.before).toEqual({
      visitId: first.visitId,
      visitDay: '2026-03-03',
      head: 'shown',
    });
    const { body } = await open(token).expect(200);
    const { before } = body;
    expect(before).toMatchObject({ visitDay: '2026-03-03', head: 'shown', view: 'front' });
    const { matched } = before;
    expect(matched.now.length).toBeGreaterThan(20);
    expect(matched.before).toHaveLength(matched.now.length);
    expect(matched.lift).toHaveLength(matched.now.length);
    expect(matched.rising).toBeGreaterThan(10);
    // wherever both frames are marked, the lifts told of them agree
    const liftOn = (overlay: { frame: number; lift: number | null }[], frame: number) =>
      overlay.find((each) => each.frame === frame)?.lift ?? null;
    let compared = 0;
    for (const [n, frame] of matched.now.entries()) {
      const one = liftOn(before.overlay, matched.before[n]);
      const other = liftOn(body.overlay, frame);
      if (one === null || other === null) continue;
      compared += 1;
      expect(Math.abs(one - other)).toBeLessThan(6);
      expect(matched.lift[n]).toBeCloseTo((one + other) / 2, 0);
    }
    expect(compared).toBeGreaterThan(3);
    expect((await film(token).buffer(true).expect(200)).body.toString()).toBe('the earlier film');
    // nothing that names the visit or its clip leaves
    for (const secret of [first.visitId, first.clipId, first.repId])
      expect(JSON.stringify(body)).not.toContain(secret);
  });

  it('tells no angle where only the call is shown', async () => {
    const { token } = await make({ showReading: false });
    const { body } = await open(token).expect(200);
    const { matched, overlay } = body.before;
    expect(matched.now.length).toBeGreaterThan(20);
    expect(new Set(matched.lift)).toEqual(new Set([null]));
    for (const each of overlay) expect(each).toMatchObject({ lift: null, turn: null });
  });

  it('is of an earlier visit of the same athlete whose side was called by eye', async () => {
    const { visitId } = now;
    const same = await ask({ beforeVisitId: visitId });
    expect(same.body).toMatchObject({ status: 422, code: 'invalid-input' });
    const turned = await ask({ beforeVisitId: visitId }, first);
    expect(turned.status).toBe(422);
    const uncalled = await trial(golden, '2026-03-10', false);
    expect((await ask({ beforeVisitId: uncalled.visitId })).body.code).toBe('call-first');
    const stranger = await api.as(api.world.foreignOwner);
    await stranger
      .post('/api/replays')
      .send({ ...now, side: later.trial.supportSide, beforeVisitId: first.visitId })
      .expect(404);
    await ask({ beforeVisitId: crypto.randomUUID() }).expect(404);
  });

  it('needs marks by which it can be matched', async () => {
    const unmarked = await trial({ ...golden, reps: [] }, '2026-03-12');
    const { body } = await ask({ beforeVisitId: unmarked.visitId });
    expect(body).toMatchObject({ status: 422 });
    expect(JSON.stringify(body)).toContain('can be matched');
  });

  it('is asked for at every playing and stops with the link', async () => {
    const { token, replay } = await make({ passPhrase: 'red leg bird' });
    await film(token).expect(401);
    const free = await make();
    await film(free.token).expect(200);
    await coach.post(`/api/replays/${free.replay.id}/revoke`).expect(200);
    await film(free.token).expect(404);
    await coach.post(`/api/replays/${replay.id}/revoke`).expect(200);
    const alone = await make({ beforeVisitId: null });
    await film(alone.token).expect(404);
    expect((await open(alone.token).expect(200)).body.before).toBeNull();
  });

  it('leaves only with its head hidden where the link hides heads, and fails closed', async () => {
    await drawHead(now, 0);
    const bare = await ask({ hideHead: true });
    expect(bare.body).toMatchObject({ status: 409, code: 'head-not-covered' });
    expect(bare.body.detail).toContain('The earlier film');
    await drawHead(first, 0);
    const { token, replay } = await make({ hideHead: true });
    expect(replay.before.head).toBe('being-prepared');
    expect((await film(token)).body.code).toBe('clip-not-ready');
    expect((await open(token)).body.before.head).toBe('being-prepared');

    const { id, head } = await api.ground.inPractice(api.world.coach, async ({ em }) => {
      const row = await em.findOneOrFail(ReplayBefore, { replay: String(replay.id) });
      const box = await em.findOneOrFail(Head, { clip: first.clipId, version: 1 });
      await em.nativeUpdate(ReplayBefore, { id: row.id }, { hiddenHead: box.id });
      return { id: row.id, head: box.id };
    });
    await put(hiddenFiles(api.world.practiceId, first.clipId, id, head).replay, 'a mosaic');
    expect((await film(token).buffer(true).expect(200)).body.toString()).toBe('a mosaic');
    // another box, at which nobody has looked
    await drawHead(first, 1, false);
    expect((await film(token)).status).toBe(409);
    expect((await open(token)).body.before.head).toBe('being-prepared');
    await coach.post(`/api/clips/${first.clipId}/head/looked`).send({ version: 2 }).expect(200);
    expect((await film(token)).status).toBe(409);
    // there is no bench copy to make it of: given up, and said
    const run = () =>
      hideHeadJob.run({
        ground: api.ground,
        practiceId: api.world.practiceId,
        payload: { replayId: id },
        signal: new AbortController().signal,
      });
    for (let n = 0; n < 3; n += 1) await expect(run()).rejects.toThrow();
    await run();
    expect((await open(token)).body.before.head).toBe('failed');
    expect((await film(token)).status).toBe(409);
    const { body: again } = await coach.post(`/api/replays/${replay.id}/hide-head`).expect(200);
    expect(again.before.head).toBe('being-prepared');
  });

  it('goes with its own clip, and the link stays', async () => {
    const { token } = await make();
    await film(token).expect(200);
    await coach.delete(`/api/clips/${first.clipId}`).expect(204);
    await film(token).expect(404);
    const { body } = await open(token).expect(200);
    expect(body.before).toBeNull();
    expect(body.overlay.length).toBeGreaterThan(10);
  });
});

import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest';
import { prepareClip } from '#server/media/prepare-clip.ts';
import { type Api, startApi } from '#tests/support/api.ts';
import { makeClip as makeFile } from '#tests/fixtures/media/make-clips.ts';
import { makeConsent } from '../athletes/athlete.factory.ts';
import { makeClip } from '../clips/clip.factory.ts';
import { clipFiles, clipPrefix, hiddenFiles } from '../clips/clip-files.ts';
import { Head } from '../heads/head.entity.ts';
import { makeVisit } from '../visits/visit.factory.ts';
import { hideHeadJob } from './jobs/hide-head.ts';
import { Replay } from './replay.entity.ts';

// real tools at low priority beside whatever else the machine does
vi.setConfig({ testTimeout: 120_000, hookTimeout: 120_000 });

let api: Api;
let folder: string;
let coach: Awaited<ReturnType<Api['as']>>;
let made: { visitId: string; repId: string; side: string };
let clipId: string;

const box = { left: 20, top: 10, width: 40, height: 40 };
const drawHead = (after: number, toFrame = 29) =>
  coach
    .post(`/api/clips/${clipId}/head`)
    .send({ after, fromFrame: 0, toFrame, drawn: [{ frame: 0, box }], followed: [] })
    .expect(201);
const look = (version: number) =>
  coach.post(`/api/clips/${clipId}/head/looked`).send({ version }).expect(200);
const ask = (more: object = {}) =>
  coach.post('/api/replays').send({ ...made, hideHead: true, ...more });
const newReplay = async () => {
  const { body } = await ask().expect(201);
  return { id: String(body.replay.id), token: String(body.url).split('/r/')[1] ?? '' };
};
const media = (token: string, which: 'video' | 'poster') =>
  api.nobody.get(`/api/r/${token}/${which}`);
const work = (replayId: string) =>
  hideHeadJob.run({
    ground: api.ground,
    practiceId: api.world.practiceId,
    payload: { replayId },
    signal: new AbortController().signal,
  });
const keysBy = (replayId: string, version: number) =>
  api.ground.inPractice(api.world.coach, async ({ em }) => {
    const { id } = await em.findOneOrFail(Head, { clip: clipId, version });
    return hiddenFiles(api.world.practiceId, clipId, replayId, id);
  });
const queued = () =>
  api.ground.inPractice(api.world.coach, ({ em }) =>
    em.execute<{ payload: object }[]>(`select payload from job_outbox where queue = 'hide-head'`),
  );

beforeAll(async () => {
  api = await startApi();
  folder = await mkdtemp(join(tmpdir(), 'hidden-head-'));
  coach = await api.as(api.world.coach);
  const { coach: user, athlete, practiceId } = api.world;
  const original = join(folder, 'constant.mp4');
  await makeFile('constant.mp4', original);
  const copies = await prepareClip({ original, outDir: join(folder, 'copies') });
  const { num, den } = copies.frames.timeBase;
  const { visit, clip } = await api.ground.inPractice(user, ({ em }) => {
    makeConsent(em, { athlete, recordedBy: user, purposes: ['assessment', 'sharing-by-link'] });
    const visit = makeVisit(em, { athlete, coach: user });
    const { width, height } = copies.facts.upright;
    const count = copies.frames.ticks.length;
    const clip = makeClip(em, {
      visit,
      uploadedBy: user,
      ...{ width, height, frameCount: count },
      frames: { count, timeBase: { num, den }, ticks: [...copies.frames.ticks] },
      copies: {
        bench: { width, height, allIntra: true, bytes: copies.bench.bytes },
        replay: { width, height, bytes: copies.replay.bytes },
        strip: { frames: [0], width: 90, height: 160 },
      },
    });
    clip.files = clipFiles(practiceId, clip.id);
    return Promise.resolve({ visit, clip });
  });
  clipId = clip.id;
  const files = clipFiles(practiceId, clipId);
  const { storage } = api.ground;
  await storage.putFile(files.bench, copies.bench.path, 'video/mp4');
  await storage.putFile(files.replay, copies.replay.path, 'video/mp4');
  await storage.putFile(files.poster, copies.poster.path, 'image/jpeg');
  const rep = await coach
    .post(`/api/clips/${clipId}/reps`)
    .send({ supportSide: 'right', startFrame: 2, endFrame: 25 })
    .expect(201);
  await coach
    .post(`/api/visits/${visit.id}/sides/right/call`)
    .send({ seen: 'early', confidence: 'sure' })
    .expect(201);
  made = { visitId: visit.id, repId: rep.body.id, side: 'right' };
});
afterAll(async () => {
  await api.close();
  await rm(folder, { recursive: true, force: true });
});

describe('a replay that promises a hidden head', () => {
  it('cannot be made until a box covers every frame and a person has looked', async () => {
    const none = await ask();
    expect(none.body).toMatchObject({ status: 409, code: 'head-not-covered' });
    expect(none.body.detail).toContain('Hide the head');
    await drawHead(0, 20);
    const bare = await ask();
    expect(bare.body).toMatchObject({ status: 409, code: 'head-not-covered' });
    expect(bare.body.detail).toContain('frames 21 to 25');
    await drawHead(1);
    const unseen = await ask();
    expect(unseen.body).toMatchObject({ status: 409, code: 'head-not-looked-at' });
    await ask({ hideHead: false }).expect(201);
    await look(2);
    const { body } = await ask().expect(201);
    expect(body.replay).toMatchObject({ head: 'being-prepared' });
    expect(await queued()).toContainEqual({ payload: { replayId: body.replay.id } });
  });

  it('gives nothing away until its copy is there, and then that copy alone', async () => {
    const { id, token } = await newReplay();
    for (const which of ['video', 'poster'] as const) {
      const { body } = await media(token, which);
      expect(body).toMatchObject({ status: 409, code: 'clip-not-ready' });
    }
    const early = await api.nobody.get(`/api/r/${token}`).expect(200);
    expect(early.body.head).toBe('being-prepared');
    await work(id);
    const opened = await api.nobody.get(`/api/r/${token}`).expect(200);
    expect(opened.body.head).toBe('hidden');
    const keys = await keysBy(id, 2);
    const { storage } = api.ground;
    const clear = clipFiles(api.world.practiceId, clipId);
    for (const [which, key, not] of [
      ['video', keys.replay, clear.replay],
      ['poster', keys.poster, clear.poster],
    ] as const) {
      const served = Buffer.from((await media(token, which).buffer(true)).body as Buffer);
      const read = async (stored: string) =>
        Buffer.concat(await (await storage.read(stored)).toArray());
      expect(served.equals(await read(key)), which).toBe(true);
      expect(served.equals(await read(not)), which).toBe(false);
    }
  });

  it('shows nothing once the box was changed, until somebody looked and the copy was made anew', async () => {
    const { id, token } = await newReplay();
    await work(id);
    await media(token, 'video').expect(200);
    const { storage } = api.ground;
    const old = await keysBy(id, 2);
    await drawHead(2);
    await media(token, 'video').expect(409);
    await media(token, 'poster').expect(409);
    const listed = await coach.get(`/api/replays?visitId=${made.visitId}`);
    const state = listed.body.items.find((row: { id: string }) => row.id === id).head;
    expect(state).toBe('to-be-looked-at');
    // a copy is not made by a box that nobody has looked at
    await work(id);
    await media(token, 'video').expect(409);
    const before = (await queued()).length;
    await look(3);
    expect((await queued()).length).toBeGreaterThan(before);
    await media(token, 'video').expect(409);
    await work(id);
    await media(token, 'video').expect(200);
    expect(await storage.exists(old.replay)).toBe(false);
    expect(await storage.exists(old.poster)).toBe(false);
  });

  it('keeps no copy of an ended link', async () => {
    const { id, token } = await newReplay();
    await work(id);
    const keys = await keysBy(id, 3);
    expect(await api.ground.storage.exists(keys.replay)).toBe(true);
    await coach.post(`/api/replays/${id}/revoke`).expect(200);
    await media(token, 'video').expect(404);
    expect(await api.ground.storage.exists(keys.replay)).toBe(false);
    await work(id);
    expect(await api.ground.storage.exists(keys.replay)).toBe(false);
  });

  it('is taken up again by a worker that starts, as long as its copy is missing', async () => {
    const { id } = await newReplay();
    const { Client } = await import('pg');
    const client = new Client({ connectionString: api.ground.config.database.jobs });
    await client.connect();
    const waiting = async () =>
      (await client.query<{ replay_id: string }>('select replay_id from heads_to_hide()')).rows.map(
        (row) => row.replay_id,
      );
    expect(await waiting()).toContain(id);
    await work(id);
    expect(await waiting()).not.toContain(id);
    await client.end();
  });

  it('goes with its clip, files and all', async () => {
    const { id, token } = await newReplay();
    await work(id);
    const keys = await keysBy(id, 3);
    expect(keys.replay.startsWith(clipPrefix(api.world.practiceId, clipId))).toBe(true);
    await coach.delete(`/api/clips/${clipId}`).expect(204);
    await media(token, 'video').expect(404);
    expect(await api.ground.storage.exists(keys.replay)).toBe(false);
    const left = await api.ground.inPractice(api.world.coach, ({ em }) => em.count(Replay, { id }));
    expect(left).toBe(0);
  });
});

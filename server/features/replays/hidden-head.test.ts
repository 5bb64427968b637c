import { mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest';
import { MOST_TRIES } from '#server/jobs/tries.ts';
import { asJobs } from '#tests/support/as-jobs.ts';
import { type Api, startApi } from '#tests/support/api.ts';
import { playedClip } from '#tests/support/played-clip.ts';
import { clipFiles, clipPrefix, hiddenFiles } from '../clips/clip-files.ts';
import { Head } from '../heads/head.entity.ts';
import { hideHeadJob } from './jobs/hide-head.ts';
import { removeHiddenJob } from './jobs/remove-hidden.ts';
import { ReplayBefore } from './before/replay-before.entity.ts';
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
const contextOf = (replayId: string, signal = new AbortController().signal) => ({
  ground: api.ground,
  practiceId: api.world.practiceId,
  payload: { replayId },
  signal,
});
const work = (replayId: string) => hideHeadJob.run(contextOf(replayId));
const change = (id: string, to: object) =>
  api.ground.inPractice(api.world.coach, ({ em }) => em.nativeUpdate(Replay, { id }, to));
const rowOf = async (id: string) => {
  const { body } = await coach.get(`/api/replays?visitId=${made.visitId}`).expect(200);
  return body.items.find((row: { id: string }) => row.id === id);
};
const headBy = async (token: string) =>
  (await api.nobody.get(`/api/r/${token}/film`).expect(200)).body;
/** What the queue would be given at the start of a worker. */
const waiting = async (sql: string | undefined): Promise<string[]> =>
  (await asJobs<{ replay_id: string }>(api, sql)).map((row) => row.replay_id);
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
  ({ coach, clipId, of: made } = await playedClip(api, folder));
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
    expect((await rowOf(id)).head).toBe('to-be-looked-at');
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
    const missing = () => waiting(hideHeadJob.unfinished?.sql);
    expect(await missing()).toContain(id);
    await work(id);
    expect(await missing()).not.toContain(id);
  });

  it('says so where its copy cannot be made, until a person asks for it again', async () => {
    const { id, token } = await newReplay();
    const { storage } = api.ground;
    const { bench } = clipFiles(api.world.practiceId, clipId);
    const kept = join(folder, 'bench.mp4');
    await writeFile(kept, await storage.read(bench));
    await storage.delete(bench);
    for (let nth = 1; nth < MOST_TRIES; nth += 1) {
      await expect(work(id)).rejects.toThrow();
      expect(await headBy(token)).toEqual({ head: 'being-prepared' });
    }
    await work(id);
    expect(await headBy(token)).toEqual({ head: 'failed' });
    expect(await rowOf(id)).toMatchObject({ head: 'failed', state: 'live' });
    expect(await waiting(hideHeadJob.unfinished?.sql)).not.toContain(id);
    await media(token, 'video').expect(409);
    // the file comes back; nothing is tried until somebody asks
    await storage.putFile(bench, kept, 'video/mp4');
    await work(id);
    expect((await rowOf(id)).head).toBe('failed');
    const before = (await queued()).length;
    const { body } = await coach.post(`/api/replays/${id}/hide-head`).expect(200);
    expect(body).toMatchObject({ id, head: 'being-prepared' });
    await coach.post(`/api/replays/${id}/hide-head`).expect(200);
    expect((await queued()).length).toBe(before + 1);
    await work(id);
    expect(await headBy(token)).toEqual({ head: 'hidden' });
    await media(token, 'video').expect(200);
  });

  it('gives up on a copy that took every worker along, not on one that a stop cut short', async () => {
    const { id } = await newReplay();
    await expect(hideHeadJob.run(contextOf(id, AbortSignal.abort()))).rejects.toThrow();
    const triesOf = () =>
      api.ground.inPractice(api.world.coach, ({ em }) => em.findOneOrFail(Replay, { id }));
    expect((await triesOf()).hideTries).toBe(0);
    await change(id, { hideTries: MOST_TRIES });
    await work(id);
    expect((await rowOf(id)).head).toBe('failed');
    // another box is another chance
    await drawHead(3);
    await look(4);
    expect((await rowOf(id)).head).toBe('being-prepared');
  });

  it('loses its copy once it has lapsed or was ended, and keeps it until then', async () => {
    const { storage } = api.ground;
    const remove = (id: string) => removeHiddenJob.run(contextOf(id));
    const ended = () => waiting(removeHiddenJob.unfinished?.sql);
    for (const end of [{ expiresAt: new Date(Date.now() - 1000) }, { revokedAt: new Date() }]) {
      const { id, token } = await newReplay();
      await work(id);
      const keys = await keysBy(id, 4);
      await remove(id);
      await media(token, 'video').expect(200);
      expect(await ended()).not.toContain(id);
      await change(id, end);
      await media(token, 'video').expect(404);
      expect(await storage.exists(keys.replay)).toBe(true);
      expect(await ended()).toContain(id);
      await remove(id);
      expect(await storage.exists(keys.replay)).toBe(false);
      expect(await storage.exists(keys.poster)).toBe(false);
      expect(await ended()).not.toContain(id);
      // a copy that was still being made is not kept either
      await work(id);
      expect(await storage.exists(keys.replay)).toBe(false);
    }
  });

  it('hides the head of the earlier film beside it as well, in a copy that goes with the link', async () => {
    const other = await playedClip(api, await mkdtemp(join(folder, 'earlier-')));
    await coach
      .post(`/api/clips/${other.clipId}/head`)
      .send({ after: 0, fromFrame: 0, toFrame: 29, drawn: [{ frame: 0, box }], followed: [] })
      .expect(201);
    await coach.post(`/api/clips/${other.clipId}/head/looked`).send({ version: 1 }).expect(200);
    const { id, token } = await newReplay();
    const { before, keys } = await api.ground.inPractice(api.world.coach, async ({ em }) => {
      const row = em.create(ReplayBefore, {
        replay: id,
        rep: other.of.repId,
        fromFrame: 2,
        toFrame: 25,
        hideHead: true,
      });
      const head = await em.findOneOrFail(Head, { clip: other.clipId });
      const { practiceId } = api.world;
      return {
        before: row.id,
        keys: hiddenFiles(practiceId, other.clipId, row.id, head.id),
      };
    });
    const film = () => api.nobody.get(`/api/r/${token}/before/video`);
    expect(await waiting(hideHeadJob.unfinished?.sql)).toContain(before);
    await film().expect(409);
    await work(before);
    const served = Buffer.from((await film().buffer(true).expect(200)).body as Buffer);
    const read = async (stored: string) =>
      Buffer.concat(await (await api.ground.storage.read(stored)).toArray());
    expect(served.equals(await read(keys.replay))).toBe(true);
    const clear = clipFiles(api.world.practiceId, other.clipId);
    expect(served.equals(await read(clear.replay))).toBe(false);
    expect(await waiting(hideHeadJob.unfinished?.sql)).not.toContain(before);
    await change(id, { revokedAt: new Date() });
    expect(await waiting(removeHiddenJob.unfinished?.sql)).toContain(id);
    await removeHiddenJob.run(contextOf(id));
    expect(await api.ground.storage.exists(keys.replay)).toBe(false);
    expect(await waiting(removeHiddenJob.unfinished?.sql)).not.toContain(id);
  });

  it('has its end put down as a job when it is made', async () => {
    const { id } = await newReplay();
    const rows = await api.ground.inPractice(api.world.coach, ({ em }) =>
      em.execute<{ start_after: string; expires_at: string }[]>(
        `select o.start_after, r.expires_at from job_outbox o join replay r on r.id = ?
         where o.queue = 'remove-hidden' and o.payload ->> 'replayId' = r.id::text`,
        [id],
      ),
    );
    expect(rows).toHaveLength(1);
    expect(new Date(rows[0]?.start_after ?? NaN)).toEqual(new Date(rows[0]?.expires_at ?? NaN));
  });

  it('goes with its clip, files and all', async () => {
    const { id, token } = await newReplay();
    await work(id);
    const keys = await keysBy(id, 4);
    expect(keys.replay.startsWith(clipPrefix(api.world.practiceId, clipId))).toBe(true);
    await coach.delete(`/api/clips/${clipId}`).expect(204);
    await media(token, 'video').expect(404);
    expect(await api.ground.storage.exists(keys.replay)).toBe(false);
    const left = await api.ground.inPractice(api.world.coach, ({ em }) => em.count(Replay, { id }));
    expect(left).toBe(0);
  });
});

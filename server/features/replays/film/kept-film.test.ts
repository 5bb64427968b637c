import { execFile } from 'node:child_process';
import { mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { promisify } from 'node:util';
import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest';
import { readCopy } from '#server/media/read-copies.ts';
import { type Api, startApi } from '#tests/support/api.ts';
import { playedClip } from '#tests/support/played-clip.ts';
import { AuditEntry } from '../../audit/audit-entry.entity.ts';
import { clipFiles, hiddenFiles, keptFilmKey } from '../../clips/clip-files.ts';
import { Head } from '../../heads/head.entity.ts';
import { hideHeadJob } from '../jobs/hide-head.ts';
import { removeHiddenJob } from '../jobs/remove-hidden.ts';
import { Replay } from '../replay.entity.ts';
import { makeFilmJob } from './jobs/make-film.ts';
import { KeptFilm } from './kept-film.entity.ts';

// real tools at low priority beside whatever else the machine does
vi.setConfig({ testTimeout: 120_000, hookTimeout: 120_000 });

let api: Api;
let folder: string;
let played: Awaited<ReturnType<typeof playedClip>>;
/** Head of the test's own clip; the picture is 192 × 108. */
const box = { left: 20, top: 10, width: 40, height: 40 };

const newLink = async (more: object = {}) => {
  const { body } = await played.coach
    .post('/api/replays')
    .send({ ...played.of, ...more })
    .expect(201);
  return { id: String(body.replay.id), token: String(body.url).split('/r/')[1] ?? '' };
};
const ask = (id: string) => played.coach.post(`/api/replays/${id}/kept-film`);
const byStaff = (id: string) => played.coach.get(`/api/replays/${id}/kept-film`).buffer(true);
const byLink = (token: string) => api.nobody.get(`/api/r/${token}/kept-film`).buffer(true);
const filmOf = (id: string) =>
  api.ground.inPractice(api.world.coach, ({ em }) => em.findOneOrFail(KeptFilm, { replay: id }));
const work = async (id: string, signal = new AbortController().signal) =>
  makeFilmJob.run({
    ground: api.ground,
    practiceId: api.world.practiceId,
    payload: { filmId: (await filmOf(id)).id },
    signal,
  });
const onLink = (job: typeof hideHeadJob, replayId: string) =>
  job.run({
    ground: api.ground,
    practiceId: api.world.practiceId,
    payload: { replayId },
    signal: new AbortController().signal,
  });
const rowOf = async (id: string) => {
  const { body } = await played.coach.get(`/api/replays?visitId=${played.of.visitId}`).expect(200);
  return body.items.find((row: { id: string }) => row.id === id);
};
const change = (id: string, to: object) =>
  api.ground.inPractice(api.world.coach, ({ em }) => em.nativeUpdate(Replay, { id }, to));
const audited = (id: string) =>
  api.ground.inPractice(api.world.coach, async ({ em }) =>
    (await em.find(AuditEntry, { subjectId: id }, { orderBy: { at: 'asc', id: 'asc' } })).map(
      ({ action }) => action,
    ),
  );
const keyOf = async (id: string) =>
  keptFilmKey(api.world.practiceId, played.clipId, (await filmOf(id)).id);
const made = async (more: object = {}) => {
  const link = await newLink(more);
  await ask(link.id).expect(202);
  await work(link.id);
  return link;
};

/** Brightness of the head's box in every frame of a film, rows of the picture's own size. */
const heads = async (path: string): Promise<Buffer> => {
  const { stdout } = await promisify(execFile)(
    'ffmpeg',
    [
      ...['-nostdin', '-v', 'error', '-i', path, '-fps_mode', 'passthrough'],
      ...['-vf', `crop=${box.width}:${box.height}:${box.left}:${box.top}:exact=1`],
      ...['-f', 'rawvideo', '-pix_fmt', 'gray', '-'],
    ],
    { encoding: 'buffer', maxBuffer: 64 * 1024 ** 2 },
  );
  return stdout;
};
/** How much neighbours in a row differ on average: fine detail. */
const detail = (pixels: Buffer): number => {
  let sum = 0;
  for (let n = 1; n < pixels.length; n += 1)
    if (n % box.width > 0) sum += Math.abs((pixels[n] ?? 0) - (pixels[n - 1] ?? 0));
  return sum / pixels.length;
};
const stored = async (key: string, name: string): Promise<string> => {
  const path = join(folder, name);
  await writeFile(path, await api.ground.storage.read(key));
  return path;
};

beforeAll(async () => {
  api = await startApi();
  folder = await mkdtemp(join(tmpdir(), 'kept-film-'));
  played = await playedClip(api, folder);
  await played.coach
    .post(`/api/clips/${played.clipId}/head`)
    .send({ after: 0, fromFrame: 0, toFrame: 29, drawn: [{ frame: 0, box }], followed: [] })
    .expect(201);
  await played.coach
    .post(`/api/clips/${played.clipId}/head/looked`)
    .send({ version: 1 })
    .expect(200);
});
afterAll(async () => {
  await api.close();
  await rm(folder, { recursive: true, force: true });
});

describe('the film of a link to keep', () => {
  it('is made when somebody asks, of the span alone, and then handed over to coach and athlete', async () => {
    const { id, token } = await newLink();
    expect((await rowOf(id)).film).toBeNull();
    await byStaff(id).expect(409);
    await byLink(token).expect(409);
    expect((await api.nobody.get(`/api/r/${token}`).expect(200)).body.film).toBeNull();
    expect((await ask(id).expect(202)).body.film).toMatchObject({ state: 'asked', bytes: null });
    // asking twice is asking once
    await ask(id).expect(202);
    await byLink(token).expect(409);
    await work(id);
    const { film } = await rowOf(id);
    expect(film).toMatchObject({ state: 'ready', taken: 0, lastTakenAt: null });
    expect((await api.nobody.get(`/api/r/${token}`).expect(200)).body.film).toEqual({
      bytes: film.bytes,
      madeAt: film.madeAt,
    });
    for (const answer of [await byStaff(id).expect(200), await byLink(token).expect(200)]) {
      expect(answer.headers).toMatchObject({
        'content-type': 'video/mp4',
        'content-disposition': expect.stringMatching(/^attachment; filename="?[\d-]+-replay\.mp4/),
        'cache-control': 'private, no-cache',
        'content-length': String(film.bytes),
      });
    }
    const copy = await readCopy(await stored(await keyOf(id), 'film.mp4'));
    expect(copy?.frames.ticks).toHaveLength(24);
    expect(copy?.width).toBe(played.size.width);
    // picture and, under it, words
    expect(copy?.height).toBeGreaterThan(played.size.height + 20);
  });

  it('is counted and written down each time it is taken, not for each part of it', async () => {
    const { id, token } = await made();
    await byLink(token).expect(200);
    await byLink(token).set('Range', 'bytes=0-9').expect(206);
    await byLink(token).set('Range', 'bytes=10-19').expect(206);
    await byStaff(id).expect(200);
    expect((await rowOf(id)).film).toMatchObject({ taken: 2, lastTakenAt: expect.any(String) });
    expect(await audited(id)).toEqual([
      'replay.make',
      'replay.film',
      'replay.film-taken',
      'replay.film-taken',
      'replay.film-open',
    ]);
  });

  it('is for nobody who does not see the athlete, and asked for only by who makes links', async () => {
    const { id } = await made();
    for (const user of [api.world.otherCoach, api.world.foreignCoach, api.world.foreignOwner]) {
      const agent = await api.as(user);
      await agent.get(`/api/replays/${id}/kept-film`).expect(404);
      await agent.post(`/api/replays/${id}/kept-film`).expect(404);
    }
    await api.nobody.get(`/api/replays/${id}/kept-film`).expect(401);
  });

  it('asks for the pass phrase as the replay does', async () => {
    const { token } = await made({ passPhrase: 'heron reed' });
    expect((await byLink(token).expect(401)).body).toMatchObject({ code: 'pass-phrase-needed' });
    const given = await api.nobody
      .post(`/api/r/${token}/unlock`)
      .send({ passPhrase: 'heron reed' })
      .expect(204);
    const [cookie = ''] = String(given.headers['set-cookie']).split(';');
    await byLink(token).set('Cookie', cookie).expect(200);
  });

  it('goes with its link: at once where that is ended, soon where it lapses', async () => {
    const { storage } = api.ground;
    const ended = await made();
    const key = await keyOf(ended.id);
    expect(await storage.exists(key)).toBe(true);
    await played.coach.post(`/api/replays/${ended.id}/revoke`).expect(200);
    expect(await storage.exists(key)).toBe(false);
    await byLink(ended.token).expect(404);
    await byStaff(ended.id).expect(409);
    await ask(ended.id).expect(410);
    const lapsed = await made();
    const other = await keyOf(lapsed.id);
    await onLink(removeHiddenJob, lapsed.id);
    expect(await storage.exists(other)).toBe(true);
    await change(lapsed.id, { expiresAt: new Date(Date.now() - 1000) });
    await byStaff(lapsed.id).expect(409);
    await onLink(removeHiddenJob, lapsed.id);
    expect(await storage.exists(other)).toBe(false);
    expect((await rowOf(lapsed.id)).film).toBeNull();
  });

  it('is not kept where its link ended while it was being made', async () => {
    const { id } = await newLink();
    await ask(id).expect(202);
    const put = api.ground.storage.putFile.bind(api.ground.storage);
    const slow = vi.spyOn(api.ground.storage, 'putFile').mockImplementation(async (...file) => {
      await put(...file);
      await change(id, { revokedAt: new Date() });
    });
    await work(id);
    slow.mockRestore();
    expect(await api.ground.storage.exists(await keyOf(id))).toBe(false);
    expect((await filmOf(id)).state).toBe('asked');
  });

  it('says so where it cannot be made, until a person asks again', async () => {
    const { id } = await newLink();
    await ask(id).expect(202);
    const { storage } = api.ground;
    const { bench } = clipFiles(api.world.practiceId, played.clipId);
    const kept = await stored(bench, 'bench.mp4');
    await storage.delete(bench);
    await expect(work(id, AbortSignal.abort())).rejects.toThrow();
    expect((await filmOf(id)).tries).toBe(0);
    for (let nth = 1; nth < 4; nth += 1) await expect(work(id)).rejects.toThrow();
    expect((await rowOf(id)).film.state).toBe('asked');
    await work(id);
    expect((await rowOf(id)).film.state).toBe('failed');
    await storage.putFile(bench, kept, 'video/mp4');
    await work(id);
    expect((await rowOf(id)).film.state).toBe('failed');
    expect((await ask(id).expect(202)).body.film.state).toBe('asked');
    await work(id);
    expect((await rowOf(id)).film.state).toBe('ready');
  });
});

describe('the film of a link that hides the head', () => {
  it('waits for the copy with the hidden head, and is made of that alone', async () => {
    const { id, token } = await newLink({ hideHead: true });
    await ask(id).expect(202);
    expect((await rowOf(id)).film.state).toBe('head-first');
    await work(id);
    expect((await filmOf(id)).tries).toBe(0);
    await byLink(token).expect(409);
    await onLink(hideHeadJob, id);
    // the clear copy is out of reach: it could not be made of that
    const { bench } = clipFiles(api.world.practiceId, played.clipId);
    const clear = await stored(bench, 'clear.mp4');
    await api.ground.storage.delete(bench);
    await work(id);
    await byLink(token).expect(200);
    const film = await stored(await keyOf(id), 'hidden.mp4');
    await api.ground.storage.putFile(bench, clear, 'video/mp4');
    const open = await made();
    const shown = await stored(await keyOf(open.id), 'shown.mp4');
    expect(detail(await heads(shown))).toBeGreaterThan(4 * detail(await heads(film)));
  });

  it('is handed to nobody once the box was changed, and made anew once somebody has looked', async () => {
    const { id, token } = await newLink({ hideHead: true });
    await onLink(hideHeadJob, id);
    await ask(id).expect(202);
    await work(id);
    await byLink(token).expect(200);
    await played.coach
      .post(`/api/clips/${played.clipId}/head`)
      .send({ after: 1, fromFrame: 0, toFrame: 29, drawn: [{ frame: 0, box }], followed: [] })
      .expect(201);
    await byLink(token).expect(409);
    await byStaff(id).expect(409);
    expect((await rowOf(id)).film.state).toBe('head-first');
    expect((await api.nobody.get(`/api/r/${token}`).expect(200)).body.film).toBeNull();
    await played.coach
      .post(`/api/clips/${played.clipId}/head/looked`)
      .send({ version: 2 })
      .expect(200);
    await onLink(hideHeadJob, id);
    expect((await rowOf(id)).film.state).toBe('asked');
    await byLink(token).expect(409);
    await work(id);
    await byLink(token).expect(200);
    const { head } = await filmOf(id);
    const current = await api.ground.inPractice(api.world.coach, ({ em }) =>
      em.findOneOrFail(Head, { clip: played.clipId, version: 2 }),
    );
    expect(head?.id).toBe(current.id);
    const old = hiddenFiles(api.world.practiceId, played.clipId, id, current.id);
    expect(await api.ground.storage.exists(old.replay)).toBe(true);
  });
});

describe('without consent to sharing by a link', () => {
  it('the films go with the links, and no other is made', async () => {
    const { id, token } = await made();
    const key = await keyOf(id);
    await played.coach
      .post(`/api/athletes/${api.world.athlete.id}/withdrawals`)
      .send({ purposes: ['sharing-by-link'] })
      .expect(200);
    await byLink(token).expect(404);
    await byStaff(id).expect(409);
    await ask(id).expect(409);
    await onLink(removeHiddenJob, id);
    expect(await api.ground.storage.exists(key)).toBe(false);
  });
});

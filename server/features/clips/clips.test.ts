import { execFileSync } from 'node:child_process';
import { mkdtemp, readdir, readFile, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type Api, startApi } from '#tests/support/api.ts';
import { makeVisit } from '../visits/visit.factory.ts';
import { makeAthlete } from '../athletes/athlete.factory.ts';
import { prepareClipJob } from './jobs/prepare-clip.ts';

const PLACE = '+52.5200+013.4050/';

let api: Api;
let folder: string;
let coach: Awaited<ReturnType<Api['as']>>;
let film: Buffer;

beforeAll(async () => {
  api = await startApi();
  coach = await api.as(api.world.coach);
  folder = await mkdtemp(join(tmpdir(), 'redshank-clips-'));
  const path = join(folder, 'film.mov');
  execFileSync('ffmpeg', [
    ...['-v', 'error', '-y', '-f', 'lavfi', '-i', 'testsrc=size=320x180:rate=30:duration=1.5'],
    ...['-metadata', `location=${PLACE}`, '-pix_fmt', 'yuv420p', '-c:v', 'libx264', path],
  ]);
  film = await readFile(path);
});
afterAll(async () => {
  await api.close();
  await rm(folder, { recursive: true, force: true });
});

const send = (name = 'film.mov', body = film) =>
  coach
    .post(`/api/visits/${api.world.visit.id}/clips`)
    .field('view', 'front')
    .attach('clip', body, name);

const prepare = (clipId: string) =>
  prepareClipJob.run({
    ground: api.ground,
    practiceId: api.world.practiceId,
    payload: { clipId },
    signal: new AbortController().signal,
  });

const ready = async (): Promise<string> => {
  const { body } = await send().expect(201);
  await prepare(body.id);
  return body.id as string;
};

/** Every file of the instance's storage, whatever its folder. */
const storedFiles = async (): Promise<string[]> => {
  const root = api.ground.config.uploads.toString();
  const entries = await readdir(root, { recursive: true, withFileTypes: true });
  return entries
    .filter((entry) => entry.isFile())
    .map(({ parentPath, name }) => join(parentPath, name));
};

describe('a clip sent as a form', () => {
  it('waits, is prepared, and says exactly when each frame is shown', async () => {
    const { body } = await send().expect(201);
    expect(body).toMatchObject({
      state: 'waiting',
      name: 'film.mov',
      view: 'front',
      cameraStood: 'front',
      geometry: { distanceMm: 3000, lensHeightMm: 950, scale: null },
      mmPerPx: null,
    });
    await prepare(body.id);
    const clip = await coach.get(`/api/clips/${body.id}`).expect(200);
    expect(clip.body).toMatchObject({ state: 'ready', width: 320, height: 180, refusal: null });
    const { count, timeBase, ticks } = clip.body.frames;
    expect(count).toBe(45);
    const seconds = ticks.map((tick: number) => (tick * timeBase.num) / timeBase.den);
    seconds.forEach((second: number, n: number) => expect(second).toBeCloseTo(n / 30, 9));
    expect(clip.body.frameRate).toMatchObject({ perSecond: 30, variable: false });
  });

  it('takes its fields in any order', async () => {
    const { body } = await coach
      .post(`/api/visits/${api.world.visit.id}/clips`)
      .attach('clip', film, 'side.mov')
      .field('supportSide', 'left')
      .field('view', 'lifted-side')
      .expect(201);
    expect(body).toMatchObject({ supportSide: 'left', cameraStood: 'athlete-right' });
  });

  it('is refused with its own sentence where it is no video', async () => {
    const { body } = await send('notes.mp4', Buffer.from('not a film '.repeat(500))).expect(201);
    await prepare(body.id);
    const clip = await coach.get(`/api/clips/${body.id}`).expect(200);
    expect(clip.body.state).toBe('refused');
    expect(clip.body.refusal.sentence.length).toBeGreaterThan(20);
    const video = await coach.get(`/api/clips/${body.id}/video`);
    expect(video.body).toMatchObject({ status: 409, code: 'clip-refused' });
  });

  it('says what is missing of the form, and leaves nothing behind', async () => {
    const before = await storedFiles();
    const nothing = await coach
      .post(`/api/visits/${api.world.visit.id}/clips`)
      .field('view', 'front');
    expect(nothing.body).toMatchObject({ status: 422, faults: [{ path: 'body.clip' }] });
    const noView = await coach
      .post(`/api/visits/${api.world.visit.id}/clips`)
      .attach('clip', film, 'film.mov');
    expect(noView.body).toMatchObject({ status: 422, faults: [{ path: 'body.view' }] });
    const other = await coach
      .post(`/api/visits/${api.world.visit.id}/clips`)
      .field('view', 'front')
      .attach('film', film, 'film.mov');
    expect(other.body).toMatchObject({ status: 422, faults: [{ path: 'body.film' }] });
    await expect.poll(storedFiles).toEqual(before);
  });

  it('is not taken without consent or safety check', async () => {
    const { coach: user } = api.world;
    const [without, unasked] = await api.ground.inPractice(user, ({ em }) => {
      const athlete = makeAthlete(em, { coach: user });
      return Promise.resolve([
        makeVisit(em, { athlete, coach: user }),
        makeVisit(em, { athlete: api.world.athlete, coach: user, safety: null }),
      ]);
    });
    for (const [visit, code] of [
      [without, 'consent-missing'],
      [unasked, 'safety-check-missing'],
    ] as const) {
      const answer = await coach
        .post(`/api/visits/${visit?.id}/clips`)
        .field('view', 'front')
        .attach('clip', film, 'film.mov');
      expect(answer.body).toMatchObject({ status: 409, code });
      const opened = await coach
        .post(`/api/visits/${visit?.id}/uploads`)
        .send({ name: 'film.mov', bytes: film.length, view: 'front' });
      expect(opened.body).toMatchObject({ status: 409, code });
    }
  });
});

describe('a prepared clip', () => {
  let id: string;
  beforeAll(async () => {
    id = await ready();
  });

  it('is played by ranges', async () => {
    const whole = await coach.get(`/api/clips/${id}/video`).expect(200);
    expect(whole.headers['content-type']).toBe('video/mp4');
    expect(whole.headers['cache-control']).toContain('private');
    const bytes = Number(whole.headers['content-length']);
    const part = await coach.get(`/api/clips/${id}/video`).set('Range', 'bytes=10-19').expect(206);
    expect(part.headers['content-range']).toBe(`bytes 10-19/${bytes}`);
    const outside = await coach.get(`/api/clips/${id}/video`).set('Range', `bytes=${bytes}-`);
    expect(outside.body).toMatchObject({ status: 416, code: 'range-not-satisfiable' });
  });

  it('shows poster, strip, sheet and the exact frame, and no frame that it has not', async () => {
    for (const path of ['poster', 'strip', 'sheets/0', 'sheets/1', 'frames/44']) {
      const picture = await coach.get(`/api/clips/${id}/${path}`).expect(200);
      expect(picture.headers['content-type']).toBe('image/jpeg');
      expect((picture.body as Buffer).subarray(0, 3)).toEqual(Buffer.from([0xff, 0xd8, 0xff]));
    }
    for (const path of ['frames/45', 'sheets/2']) {
      const none = await coach.get(`/api/clips/${id}/${path}`);
      expect(none.body).toMatchObject({ status: 422, code: 'frame-out-of-range' });
    }
  });

  it('is corrected once, not over somebody else’s correction', async () => {
    const { body } = await coach.get(`/api/clips/${id}`);
    const geometry = {
      ...body.geometry,
      scale: { from: 'rod', a: { u: 10, v: 10 }, b: { u: 10, v: 170 }, lengthMm: 1200 },
    };
    const edited = await coach
      .patch(`/api/clips/${id}`)
      .send({ version: body.version, geometry })
      .expect(200);
    expect(edited.body.mmPerPx).toBeCloseTo(7.5, 12);
    const late = await coach.patch(`/api/clips/${id}`).send({ version: body.version, geometry });
    expect(late.body).toMatchObject({ status: 409, code: 'edited-meanwhile' });
    const side = await coach
      .patch(`/api/clips/${id}`)
      .send({ version: edited.body.version, view: 'support-side', supportSide: null });
    expect(side.body).toMatchObject({ status: 422, code: 'support-side-needed' });
  });

  it('is listed for who may see it, and for nobody else', async () => {
    const mine = await coach.get('/api/clips?state=ready').expect(200);
    expect(mine.body.items.map((row: { id: string }) => row.id)).toContain(id);
    const other = await (await api.as(api.world.otherCoach)).get('/api/clips').expect(200);
    expect(other.body).toMatchObject({ items: [], total: 0 });
  });

  it('does not exist for another caseload or practice, its media included', async () => {
    for (const user of [api.world.otherCoach, api.world.foreignCoach, api.world.foreignOwner]) {
      const stranger = await api.as(user);
      for (const path of ['', '/video', '/poster', '/strip', '/sheets/0', '/frames/0'])
        await stranger.get(`/api/clips/${id}${path}`).expect(404);
      await stranger.patch(`/api/clips/${id}`).send({ version: 1, mirrored: true }).expect(404);
      await stranger.delete(`/api/clips/${id}`).expect(404);
    }
    await api.nobody.get(`/api/clips/${id}/video`).expect(401);
  });

  it('carries its location nowhere', async () => {
    for (const path of await storedFiles())
      if (path.includes(id)) expect((await readFile(path)).includes(PLACE), path).toBe(false);
  });

  it('is deleted with every file', async () => {
    const gone = await ready();
    await coach.get(`/api/clips/${gone}/frames/3`).expect(200);
    expect((await storedFiles()).some((path) => path.includes(gone))).toBe(true);
    await coach.delete(`/api/clips/${gone}`).expect(204);
    expect((await storedFiles()).filter((path) => path.includes(gone))).toEqual([]);
    await coach.get(`/api/clips/${gone}`).expect(404);
  });
});

describe('a resumable upload', () => {
  const open = async () => {
    const { body } = await coach
      .post(`/api/visits/${api.world.visit.id}/uploads`)
      .send({ name: 'long.mov', bytes: film.length, view: 'front' })
      .expect(201);
    return body as { id: string; uploadUrl: string };
  };
  const tus = { 'Tus-Resumable': '1.0.0' };
  const piece = (url: string, from: number, to: number) =>
    coach
      .patch(url)
      .set({
        ...tus,
        'Upload-Offset': String(from),
        'Content-Type': 'application/offset+octet-stream',
      })
      .send(film.subarray(from, to));

  it('goes on where it stopped, and its last byte makes the clip', async () => {
    const { id, uploadUrl } = await open();
    const half = Math.floor(film.length / 2);
    await piece(uploadUrl, 0, half).expect(204);
    const asked = await coach.head(uploadUrl).set(tus).expect(200);
    expect(asked.headers['upload-offset']).toBe(String(half));
    await piece(uploadUrl, half, film.length).expect(204);
    await prepare(id);
    const { body } = await coach.get(`/api/clips/${id}`).expect(200);
    expect(body).toMatchObject({ state: 'ready', name: 'long.mov', bytes: film.length });
    const again = await coach.head(uploadUrl).set(tus).expect(200);
    expect(again.headers['upload-offset']).toBe(String(film.length));
  });

  it('is taken in although the server was killed after the last byte', async () => {
    const { id, uploadUrl } = await open();
    await writeFile(join(api.ground.storage.incoming, id), film);
    await coach.head(uploadUrl).set(tus).expect(200);
    await coach.get(`/api/clips/${id}`).expect(200);
  });

  it('is given up and leaves nothing', async () => {
    const { id, uploadUrl } = await open();
    await piece(uploadUrl, 0, 100).expect(204);
    await coach.delete(uploadUrl).expect(204);
    expect((await storedFiles()).filter((path) => path.includes(id))).toEqual([]);
    const gone = await coach.head(uploadUrl).set(tus);
    expect(gone.status).toBe(410);
  });

  it('is nobody else’s', async () => {
    const { uploadUrl } = await open();
    const stranger = await api.as(api.world.foreignCoach);
    expect((await stranger.head(uploadUrl).set(tus)).status).toBe(410);
    const other = await api.as(api.world.otherCoach);
    expect((await other.head(uploadUrl).set(tus)).status).toBe(404);
    await other.delete(uploadUrl).expect(404);
    expect((await api.nobody.head(uploadUrl).set(tus)).status).toBe(401);
  });
});

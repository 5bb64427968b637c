import { execFileSync } from 'node:child_process';
import { mkdtemp, readFile, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Clip as ClipShape } from '#shared/contracts/clips.ts';
import { type Api, startApi } from '#tests/support/api.ts';
import { product } from '../../db/in-practice.ts';
import type { Ground } from '../../main/ground.ts';
import { JobOutbox } from '../../jobs/job-outbox.entity.ts';
import { Clip } from './clip.entity.ts';
import { prepareClipJob } from './jobs/prepare-clip.ts';
import { MOST_TRIES, nextTry, troubleOf } from './trouble.ts';

let api: Api;
let coach: Awaited<ReturnType<Api['as']>>;
let film: Buffer;
beforeAll(async () => {
  api = await startApi();
  coach = await api.as(api.world.coach);
  const folder = await mkdtemp(join(tmpdir(), 'redshank-trouble-'));
  const path = join(folder, 'film.mp4');
  execFileSync('ffmpeg', [
    ...['-v', 'error', '-y', '-f', 'lavfi', '-i', 'testsrc=size=320x180:rate=30:duration=1'],
    ...['-pix_fmt', 'yuv420p', '-c:v', 'libx264', path],
  ]);
  film = await readFile(path);
  await rm(folder, { recursive: true, force: true });
});
afterAll(() => api.close());

const send = async (): Promise<string> => {
  const { body } = await coach
    .post(`/api/visits/${api.world.visit.id}/clips`)
    .field('view', 'front')
    .attach('clip', film, 'film.mp4')
    .expect(201);
  return body.id as string;
};

const diskFull = (): Error =>
  Object.assign(new Error('ENOSPC: no space left on device'), { code: 'ENOSPC' });

/** The ground of a machine that has no room for a folder of work. */
const fullGround = (): Ground => ({
  ...api.ground,
  storage: Object.assign(Object.create(api.ground.storage) as Ground['storage'], {
    withTempDir: () => Promise.reject(diskFull()),
  }),
});

const prepare = (clipId: string, ground = api.ground, signal = new AbortController().signal) =>
  prepareClipJob.run({ ground, practiceId: api.world.practiceId, payload: { clipId }, signal });

const clipOf = async (id: string): Promise<ClipShape> =>
  (await coach.get(`/api/clips/${id}`).expect(200)).body as ClipShape;

/** The jobs asked for so far, first to last. */
const jobsOf = (clipId: string): Promise<JobOutbox[]> =>
  api.ground.inPractice(product(api.world.practiceId), async ({ em }) => {
    const jobs = await em.find(JobOutbox, {}, { orderBy: { createdAt: 'asc' } });
    return jobs.filter(({ payload }) => payload.clipId === clipId);
  });

const change = (id: string, row: Partial<Pick<Clip, 'state' | 'tries'>>): Promise<unknown> =>
  api.ground.inPractice(product(api.world.practiceId), ({ em }) =>
    em.nativeUpdate(Clip, { id }, row),
  );

describe('a clip that the machine could not prepare', () => {
  it('says why, and is tried again at the moment that it names', async () => {
    const id = await send();
    await prepare(id, fullGround());
    const { state, trouble, progress } = await clipOf(id);
    expect(state).toBe('waiting');
    expect(progress).toBeNull();
    expect(trouble).toMatchObject({ code: 'no-space' });
    expect(trouble?.sentence).toContain('disk is full');
    const [first, second, ...more] = await jobsOf(id);
    expect(first?.startAfter).toBeNull();
    expect(second?.startAfter?.toISOString()).toBe(trouble?.nextTryAt);
    expect(more).toEqual([]);
    await prepare(id);
    expect(await clipOf(id)).toMatchObject({ state: 'ready', trouble: null });
  });

  it('waits for a person once its tries are used up, who can ask for another', async () => {
    const id = await send();
    for (let count = 0; count < MOST_TRIES; count += 1) await prepare(id, fullGround());
    expect((await clipOf(id)).trouble).toMatchObject({ code: 'no-space', nextTryAt: null });
    // a job that was left over does nothing: the clip waits for a person
    await prepare(id);
    expect(await clipOf(id)).toMatchObject({ state: 'waiting', preparedSeconds: null });
    const asked = await coach.post(`/api/clips/${id}/prepare-again`).expect(202);
    expect(asked.body).toMatchObject({ state: 'waiting', trouble: null });
    await prepare(id);
    const ready = await clipOf(id);
    expect(ready.state).toBe('ready');
    expect(ready.preparedSeconds).toBeGreaterThan(0);
  });

  it('is not asked for again where nothing is wrong', async () => {
    const id = await send();
    const answer = await coach.post(`/api/clips/${id}/prepare-again`).expect(409);
    expect(answer.body).toMatchObject({ code: 'not-as-it-stands' });
    expect(await jobsOf(id)).toHaveLength(1);
  });
});

describe('a clip whose worker ended in the midst of it', () => {
  it('is prepared again, but not for ever: it may be what ends the worker', async () => {
    const id = await send();
    await change(id, { state: 'preparing', tries: MOST_TRIES - 1 });
    await prepare(id);
    expect((await clipOf(id)).state).toBe('ready');
    const other = await send();
    await change(other, { state: 'preparing', tries: MOST_TRIES });
    await prepare(other);
    const { state, trouble } = await clipOf(other);
    expect([state, trouble?.code, trouble?.nextTryAt]).toEqual(['waiting', 'interrupted', null]);
  });

  it('loses no try where the worker was stopped in good order', async () => {
    const id = await send();
    const stopping = new AbortController();
    stopping.abort();
    await expect(prepare(id, api.ground, stopping.signal)).rejects.toThrow('cancelled');
    expect(await clipOf(id)).toMatchObject({ state: 'waiting', trouble: null });
    const { tries } = await api.ground.inPractice(product(api.world.practiceId), ({ em }) =>
      em.findOneOrFail(Clip, { id }),
    );
    expect(tries).toBe(0);
  });
});

describe('the next try', () => {
  it('comes later each time, and in the end not by itself', () => {
    const now = new Date('2026-03-03T10:00:00Z');
    const waits = Array.from({ length: MOST_TRIES }, (_, tries) => nextTry(tries + 1, now));
    expect(waits.map((at) => at && (at.getTime() - now.getTime()) / 1000)).toEqual([
      15,
      60,
      300,
      1800,
      null,
    ]);
  });

  it('names the disk where there is no room, and the machine where nothing is known', () => {
    expect(troubleOf(diskFull())).toBe('no-space');
    expect(troubleOf(new Error('who knows'))).toBe('machine');
  });
});

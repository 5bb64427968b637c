import { execFileSync } from 'node:child_process';
import { mkdtemp, readFile, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { buffer } from 'node:stream/consumers';
import { afterAll, beforeAll, expect, it } from 'vitest';
import type { BucketStorage } from '#server/storage/bucket-storage.ts';
import { type Api, startApi } from '#tests/support/api.ts';
import { startBucket } from '#tests/support/bucket.ts';
import { clipFiles } from './clip-files.ts';
import { prepareClipJob } from './jobs/prepare-clip.ts';

const PLACE = '+59.1234+018.5678/';

let api: Api;
let folder: string;
let s3: Awaited<ReturnType<typeof startBucket>>;
let bucket: BucketStorage;

beforeAll(async () => {
  api = await startApi();
  folder = await mkdtemp(join(tmpdir(), 'redshank-bucket-'));
  s3 = await startBucket(folder);
  bucket = await s3.open();
});
afterAll(async () => {
  await s3.close();
  await api.close();
  await rm(folder, { recursive: true, force: true });
});

it('an original in a bucket loses its place too, not only the copy that is worked on', async () => {
  const path = join(folder, 'film.mov');
  execFileSync('ffmpeg', [
    ...['-v', 'error', '-y', '-f', 'lavfi', '-i', 'testsrc=size=320x180:rate=30:duration=1'],
    ...['-metadata', `location=${PLACE}`, '-pix_fmt', 'yuv420p', '-c:v', 'libx264', path],
  ]);
  const film = await readFile(path);
  expect(film.includes(PLACE)).toBe(true);
  const coach = await api.as(api.world.coach);
  const { body } = await coach
    .post(`/api/visits/${api.world.visit.id}/clips`)
    .field('view', 'front')
    .attach('clip', film, 'film.mov')
    .expect(201);
  const { practiceId } = api.world;
  const { original, bench } = clipFiles(practiceId, body.id as string);
  await bucket.putFile(original, path, 'video/quicktime');

  const ground = { ...api.ground, storage: bucket };
  const payload = { clipId: body.id as string };
  await prepareClipJob.run({ ground, practiceId, payload, signal: new AbortController().signal });

  expect(await bucket.exists(bench)).toBe(true);
  const kept = await buffer(await bucket.read(original));
  expect(kept.length).toBe(film.length);
  expect(kept.includes(PLACE)).toBe(false);
});

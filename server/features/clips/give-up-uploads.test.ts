import { utimes, writeFile } from 'node:fs/promises';
import { Readable } from 'node:stream';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { product } from '#server/db/in-practice.ts';
import { asJobs } from '#tests/support/as-jobs.ts';
import { type Api, startApi } from '#tests/support/api.ts';
import { clipFiles } from './clip-files.ts';
import { giveUpUploadsJob } from './jobs/give-up-uploads.ts';
import { Upload } from './upload.entity.ts';

const DAY_MS = 86_400_000;

let api: Api;
let coach: Awaited<ReturnType<Api['as']>>;
beforeAll(async () => {
  api = await startApi();
  coach = await api.as(api.world.coach);
});
afterAll(() => api.close());

const daysAgo = (days: number) => new Date(Date.now() - days * DAY_MS);
const received = (id: string) => join(api.ground.storage.incoming, id);

/** An upload opened some days ago, whose last byte came some days ago. */
const broken = async (opened: number, lastByte: number): Promise<string> => {
  const { body } = await coach
    .post(`/api/visits/${api.world.visit.id}/uploads`)
    .send({ name: 'a.mp4', bytes: 100, view: 'front' })
    .expect(201);
  const { id } = body as { id: string };
  await writeFile(received(id), 'a part of it');
  await utimes(received(id), daysAgo(lastByte), daysAgo(lastByte));
  await api.ground.inPractice(product(api.world.practiceId), ({ em }) =>
    em.nativeUpdate(Upload, { id }, { openedAt: daysAgo(opened) }),
  );
  return id;
};
const due = async (): Promise<string[]> =>
  (await asJobs<{ upload_id: string }>(api, giveUpUploadsJob.unfinished?.sql)).map(
    (row) => row.upload_id,
  );
const run = (uploadId: string) =>
  giveUpUploadsJob.run({
    ground: api.ground,
    practiceId: api.world.practiceId,
    payload: { uploadId },
    signal: new AbortController().signal,
  });
const isKnown = (id: string) =>
  api.ground.inPractice(product(api.world.practiceId), ({ em }) => em.count(Upload, { id }));

describe('an upload that nobody comes back for', () => {
  it('is given up after three days, with what lies in the place of its clip', async () => {
    const id = await broken(4, 4);
    const { original } = clipFiles(api.world.practiceId, id);
    await api.ground.storage.putStream(original, Readable.from(['film']), 'video/mp4');
    expect(await due()).toContain(id);
    await run(id);
    expect(await isKnown(id)).toBe(0);
    expect(await api.ground.storage.exists(original)).toBe(false);
    await expect(writeFile(received(id), '', { flag: 'wx' })).resolves.toBeUndefined();
    // done before, it does nothing
    await run(id);
  });

  it('is waited for while its bytes come, and until then', async () => {
    const slow = await broken(4, 2);
    await run(slow);
    expect(await isKnown(slow)).toBe(1);
    expect(await due()).not.toContain(await broken(2, 2));
  });
});

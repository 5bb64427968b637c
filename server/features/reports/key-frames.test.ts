import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { buffer } from 'node:stream/consumers';
import type { Readable } from 'node:stream';
import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest';
import { type Api, startApi } from '#tests/support/api.ts';
import { ffmpeg } from '#tests/fixtures/media/make-clips.ts';
import { goldenClip } from '#tests/support/golden.ts';
import { markedTrial } from '#tests/support/marked-trial.ts';
import { pdfPages } from '#tests/support/pdf-text.ts';
import { makeReportJob } from './jobs/make-report.ts';

// real tools at low priority beside whatever else the machine does
vi.setConfig({ testTimeout: 120_000, hookTimeout: 120_000 });

let api: Api;
let coach: Awaited<ReturnType<Api['as']>>;
let visitId: string;
let clip: Awaited<ReturnType<typeof markedTrial>>['clip'];
beforeAll(async () => {
  api = await startApi();
  coach = await api.as(api.world.coach);
  const trial = await markedTrial(api, coach, goldenClip('g01_early_big_thigh'));
  visitId = trial.visit.id;
  clip = trial.clip;
  await coach.post(`${trial.side}/call`).send({ seen: 'early', confidence: 'sure' }).expect(201);
});
afterAll(() => api.close());

const ask = (of = visitId) => coach.post(`/api/visits/${of}/reports`).send({});
const work = (reportId: string, signal = new AbortController().signal) =>
  makeReportJob.run({
    ground: api.ground,
    practiceId: api.world.practiceId,
    payload: { reportId },
    signal,
  });
const file = async (id: string): Promise<Buffer> => {
  const { body } = await coach
    .get(`/api/reports/${id}/file`)
    .buffer(true)
    .parse((res, done) => {
      buffer(res as unknown as Readable).then(
        (all) => done(null, all),
        (error: Error) => done(error, null),
      );
    })
    .expect(200)
    .expect('content-type', 'application/pdf')
    .expect('cache-control', 'private, no-store')
    .expect('content-disposition', /report-\d+\.pdf/);
  return body as Buffer;
};
const textOf = async (id: string) => pdfPages(await file(id)).join(' ');
const pictures = async (id: string) =>
  (await file(id)).toString('latin1').match(/\/Subtype \/Image/g)?.length ?? 0;

/** A film of the trial's size and length, so that there is something to take pictures from. */
const filmTheTrial = async () => {
  const folder = await mkdtemp(join(tmpdir(), 'report-film-'));
  const path = join(folder, 'bench.mp4');
  const { width, height, frameCount, files } = clip;
  await ffmpeg(
    ...['-f', 'lavfi', '-i', `testsrc2=s=${width}x${height}:r=60,trim=end_frame=${frameCount}`],
    ...['-c:v', 'libx264', '-preset', 'ultrafast', '-pix_fmt', 'yuv420p', path],
  );
  await api.ground.storage.putFile(String(files.bench), path, 'video/mp4');
  await rm(folder, { recursive: true });
};
const drawHead = (after: number) =>
  coach
    .post(`/api/clips/${clip.id}/head`)
    .send({
      ...{ after, fromFrame: 0, toFrame: (clip.frameCount ?? 0) - 1, followed: [] },
      drawn: [{ frame: 0, box: { left: 100, top: 60, width: 200, height: 240 } }],
    })
    .expect(201);

describe('the key frames of a report', () => {
  const made = async () => {
    const { body } = await ask().expect(202);
    await work(body.id);
    return String(body.id);
  };

  it('are left out, with the reason, until somebody has looked at a box over the head', async () => {
    const none = await made();
    expect(await textOf(none)).toContain('no box is drawn around the head in this clip');
    expect(await pictures(none)).toBe(0);
    await filmTheTrial();
    await drawHead(0);
    const unseen = await made();
    expect(await textOf(unseen)).toContain('nobody has looked yet whether the box covers');
    expect(await pictures(unseen)).toBe(0);
    await coach.post(`/api/clips/${clip.id}/head/looked`).send({ version: 1 }).expect(200);
    const hidden = await made();
    expect(await textOf(hidden)).toContain('The head is hidden in the pictures.');
    expect(await pictures(hidden)).toBe(4);
  });

  it('are left out where the box was changed between asking and making', async () => {
    const { body } = await ask().expect(202);
    await drawHead(1);
    await coach.post(`/api/clips/${clip.id}/head/looked`).send({ version: 2 }).expect(200);
    await work(body.id);
    expect(await textOf(body.id)).toContain('was changed after this report was asked for');
    expect(await pictures(body.id)).toBe(0);
  });
});

import { buffer } from 'node:stream/consumers';
import { Readable } from 'node:stream';
import pg from 'pg';
import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest';
import { MOST_TRIES } from '#server/jobs/tries.ts';
import { asJobs } from '#tests/support/as-jobs.ts';
import { type Api, startApi } from '#tests/support/api.ts';
import { goldenClip } from '#tests/support/golden.ts';
import { markedTrial } from '#tests/support/marked-trial.ts';
import { pdfPages } from '#tests/support/pdf-text.ts';
import { product } from '#server/db/in-practice.ts';
import { makeVisit } from '../visits/visit.factory.ts';
import { makeReportJob } from './jobs/make-report.ts';
import { reportKey } from './report-files.ts';
import { Report } from './report.entity.ts';

let api: Api;
let coach: Awaited<ReturnType<Api['as']>>;
let visitId: string;
let side: string;
beforeAll(async () => {
  api = await startApi();
  coach = await api.as(api.world.coach);
  const trial = await markedTrial(api, coach, goldenClip('g01_early_big_thigh'));
  visitId = trial.visit.id;
  side = trial.side;
  await coach
    .post(`${side}/call`)
    .send({ seen: 'early', confidence: 'sure', substitutions: ['heel-rises'] })
    .expect(201);
});
afterAll(() => api.close());

const emptyVisit = async (): Promise<string> => {
  const { coach: user, athlete } = api.world;
  const visit = await api.ground.inPractice(user, ({ em }) =>
    Promise.resolve(makeVisit(em, { athlete, coach: user })),
  );
  return visit.id;
};
const ask = (of = visitId) => coach.post(`/api/visits/${of}/reports`).send({});
const work = (reportId: string, signal = new AbortController().signal) =>
  makeReportJob.run({
    ground: api.ground,
    practiceId: api.world.practiceId,
    payload: { reportId },
    signal,
  });
const listed = async (of = visitId) =>
  (await coach.get(`/api/visits/${of}/reports`).expect(200)).body.items;
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
const waiting = async (): Promise<string[]> =>
  (await asJobs<{ report_id: string }>(api, 'select report_id from reports_to_make()')).map(
    (row) => row.report_id,
  );

describe('a report', () => {
  it('waits for a call by eye, which is never made up', async () => {
    const { body } = await ask(await emptyVisit()).expect(409);
    expect(body.code).toBe('call-first');
  });

  it('is made by the worker, one to three pages, and says what was seen and measured', async () => {
    const page = (await coach.get(`${side}/reading`).expect(200)).body;
    const { body: asked } = await ask().expect(202);
    expect(asked).toMatchObject({ number: 1, state: 'asked', pages: null, bytes: null });
    expect((await ask().expect(409)).body.code).toBe('report-being-made');
    expect((await coach.get(`/api/reports/${asked.id}/file`).expect(409)).body.code).toBe(
      'not-as-it-stands',
    );
    expect(await waiting()).toEqual([asked.id]);
    await work(asked.id);
    expect(await waiting()).toEqual([]);
    const [row] = await listed();
    expect(row).toMatchObject({ id: asked.id, state: 'ready' });
    const pdf = await file(asked.id);
    expect(pdf.length).toBe(row.bytes);
    const pages = pdfPages(pdf);
    expect(pages).toHaveLength(row.pages);
    expect(pages.length).toBeGreaterThanOrEqual(1);
    expect(pages.length).toBeLessThanOrEqual(3);
    const text = pages.join(' ');
    const { athlete } = api.world;
    const { reading } = page;
    for (const words of [
      `${athlete.givenName} ${athlete.familyName}`,
      'What was tested and how',
      'Turned out early between 60° and 90° of lift (sure).',
      'Also seen: heel rises.',
      'not measured',
      `Reading: ${reading.label}`,
      `+${reading.change.toFixed(1)}° ± ${reading.plusMinus.toFixed(1)}°`,
      'Not reviewed: nobody else has looked at this side.',
      'No plan is given to the athlete from this visit.',
      'from our model, no source',
      'Youdas 2007, J Sport Rehabil 16:326',
      'Limits',
      'not a diagnosis',
      `page 1 of ${pages.length}`,
    ])
      expect(text).toContain(words);
    // tagged, with its language, and told to those who cannot see it
    const raw = pdf.toString('latin1');
    expect(raw).toContain('/MarkInfo');
    expect(raw).toContain('/Lang (en-GB)');
    expect(raw).toMatch(/\/S \/Figure[\s\S]*?\/Alt/);
    expect(raw).toMatch(/SourceSans/);
  });

  it('stays as it is when a later one is made', async () => {
    const [first] = await listed();
    const before = await file(first.id);
    await coach.post(`${side}/call`).send({ seen: 'still', confidence: 'guess' }).expect(201);
    const { body: second } = await ask().expect(202);
    await work(second.id);
    expect(await listed()).toMatchObject([
      { number: 2, state: 'ready' },
      { number: 1, state: 'ready' },
    ]);
    expect((await file(first.id)).equals(before)).toBe(true);
    const text = pdfPages(await file(second.id)).join(' ');
    expect(text).toContain('Held still between 60° and 90° of lift (a guess).');
    expect(text).toContain('Turned out early');
    // run again it changes nothing
    await work(second.id);
    expect((await listed())[0]).toMatchObject({ id: second.id, state: 'ready' });
  });

  it('is given up after some tries, says so, and is made when a person asks again', async () => {
    const { body: asked } = await ask().expect(202);
    const put = vi.spyOn(api.ground.storage, 'putStream').mockRejectedValue(new Error('full'));
    for (let n = 1; n < MOST_TRIES; n += 1) await expect(work(asked.id)).rejects.toThrow('full');
    await work(asked.id);
    put.mockRestore();
    expect((await listed())[0]).toMatchObject({ id: asked.id, state: 'failed' });
    const again = await coach.post(`/api/reports/${asked.id}/again`).expect(202);
    expect(again.body.state).toBe('asked');
    await work(asked.id);
    expect((await listed())[0]).toMatchObject({ id: asked.id, state: 'ready' });
    expect((await coach.post(`/api/reports/${asked.id}/again`).expect(409)).body.code).toBe(
      'not-as-it-stands',
    );
  });

  it('is not given up for a worker that stops while it writes', async () => {
    const { body: asked } = await ask().expect(202);
    for (let n = 0; n <= MOST_TRIES; n += 1)
      await expect(work(asked.id, AbortSignal.abort())).rejects.toThrow(/abort/);
    expect((await listed())[0]).toMatchObject({ id: asked.id, state: 'asked' });
    await work(asked.id);
    expect((await listed())[0]).toMatchObject({ id: asked.id, state: 'ready' });
  });

  it('says so where its file cannot be reached', async () => {
    const [{ id }] = await listed();
    const key = reportKey(api.world.practiceId, api.world.athlete.id, id);
    const kept = await file(id);
    await api.ground.storage.delete(key);
    const { body } = await coach.get(`/api/reports/${id}/file`).expect(503);
    expect(body).toMatchObject({
      code: 'report-missing-in-storage',
      title: expect.stringContaining('report’s file'),
    });
    await api.ground.storage.putStream(key, Readable.from([kept]), 'application/pdf');
    expect((await file(id)).equals(kept)).toBe(true);
  });

  it('leaves no file of somebody who was erased while it was written', async () => {
    const { body: asked } = await ask().expect(202);
    const key = reportKey(api.world.practiceId, api.world.athlete.id, asked.id);
    const put = api.ground.storage.putStream.bind(api.ground.storage);
    const spy = vi.spyOn(api.ground.storage, 'putStream').mockImplementation(async (...of) => {
      await put(...of);
      const client = new pg.Client({ connectionString: api.ground.config.database.owner });
      await client.connect();
      await client.query(`select set_config('app.practice', $1, false)`, [api.world.practiceId]);
      await client.query('alter table report no force row level security');
      await client.query('delete from report where id = $1', [asked.id]);
      await client.query('alter table report force row level security');
      await client.end();
    });
    await work(asked.id);
    spy.mockRestore();
    expect(await api.ground.storage.exists(key)).toBe(false);
    const rows = await api.ground.inPractice(product(api.world.practiceId), ({ em }) =>
      em.count(Report, { id: asked.id }),
    );
    expect(rows).toBe(0);
  });

  it('is closed with what was filmed, and is not made without a consent', async () => {
    const [{ id }] = await listed();
    const path = `/api/reports/${id}/file`;
    await (await api.as(api.world.otherCoach)).get(path).expect(404);
    await (await api.as(api.world.foreignOwner)).get(path).expect(404);
    await (await api.as(api.world.supervisor)).get(path).expect(200);
    await coach
      .post(`/api/athletes/${api.world.athlete.id}/withdrawals`)
      .send({ purposes: ['assessment'] });
    expect((await coach.get(path).expect(403)).body.code).toBe('consent-withdrawn');
    expect((await ask().expect(403)).body.code).toBe('consent-withdrawn');
  });
});

import { ref } from '@mikro-orm/core';
import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest';
import { readingCode } from '#shared/contracts/readings.ts';
import { type Api, startApi } from '#tests/support/api.ts';
import { User } from '../../features/accounts/user.entity.ts';
import { Clip } from '../../features/clips/clip.entity.ts';
import { PREPARE_CLIP } from '../../features/clips/jobs/prepare-clip-type.ts';
import { Reading } from '../../features/readings/reading.entity.ts';
import { handles } from '../../jobs/job.ts';
import { startWorker, type Worker } from '../../jobs/worker.ts';
import { product } from '../in-practice.ts';
import { DEMO_ACCOUNTS, GREYWATER, PENNYWORT } from './accounts.ts';
import { demoReplayLine } from './demo-replay.ts';
import { fillDemoJob } from './fill-demo.job.ts';
import { GREYWATER_STORY } from './greywater-story.ts';
import { PENNYWORT_STORY } from './pennywort-story.ts';
import { seedDemo } from './seed-demo.ts';
import { seedPractice } from './seed-practice.ts';
import { storyId } from './story-id.ts';
import { clipsOf } from './story.ts';
import { readTruth } from './truth.ts';

const STORIES = [GREYWATER_STORY, PENNYWORT_STORY];
const PLACED = new Map(
  STORIES.flatMap((story) =>
    clipsOf(story).map((placed) => [storyId(story.id, ...placed.clipPlace), placed] as const),
  ),
);

/** What preparation finds, without ffmpeg: the size and the frame times that the truth gives. */
const prepareByTruth = handles({
  type: PREPARE_CLIP,
  lockKey: ({ clipId }) => clipId,
  expireInMinutes: 1,
  retryLimit: 3,
  retryDelaySeconds: 1,
  run: async ({ ground, practiceId, payload: { clipId } }) => {
    const source = PLACED.get(clipId)?.clip.source;
    const rendered = source && 'rendered' in source ? source.rendered : null;
    const truth = rendered === null ? null : await readTruth(rendered);
    const count = truth?.frames.values.lift.length ?? 0;
    await ground.inPractice(product(practiceId), async ({ em }) => {
      const clip = await em.findOneOrFail(Clip, { id: clipId }, { populate: ['frames'] });
      em.assign(
        clip,
        truth
          ? {
              state: 'ready',
              ...truth.picture,
              frameCount: count,
              frames: ref({
                count,
                timeBase: { num: 1, den: 1_000_000 },
                ticks: truth.frames.tMs.map((ms) => Math.round(1000 * ms)),
              }),
            }
          : { state: 'refused', refusalCode: 'not-a-video', refusalFigures: {} },
      );
    });
  },
});

let api: Api;
let worker: Worker;
beforeAll(async () => {
  api = await startApi();
  // the world of the other tests is a practice that is not the demo's
  for (const story of STORIES) await seedPractice(api.ground, story, 'marsh and mud');
  worker = await startWorker(api.ground, [prepareByTruth, fillDemoJob], () => undefined);
  await vi.waitFor(
    async () => {
      const readings = await api.ground.inPractice(product(GREYWATER), ({ em }) =>
        em.count(Reading),
      );
      expect(readings).toBe(7);
    },
    { timeout: 170_000, interval: 200 },
  );
}, 180_000);
afterAll(async () => {
  await worker.stop();
  await api.close();
});

const userOf = (account: { practiceId: string; email: string }): Promise<User> =>
  api.ground.inPractice(product(account.practiceId), ({ em }) =>
    em.findOneOrFail(User, { email: account.email }),
  );

describe('the demo', () => {
  it('shows every kind of reading', async () => {
    const rows = await api.ground.inPractice(product(GREYWATER), ({ em }) =>
      em.execute<
        {
          name: string;
          day: string;
          code: string;
          provisional: boolean;
          change: number;
          u: number;
        }[]
      >(
        `select a.given_name as name, r.code, r.provisional, r.change, r.u
         from reading r join visit v on v.id = r.visit_id join athlete a on a.id = v.athlete_id
         order by a.given_name, v.day`,
      ),
    );
    expect(rows.map(({ name, code, provisional }) => [name, code, provisional])).toEqual([
      ['Edda', 'holds-still', false],
      ['Mara', 'early-turn-out', false],
      ['Mara', 'not-measurable', false],
      ['Nia', 'early-turn-out', true],
      ['Otto', 'cannot-tell', false],
      ['Runa', 'lift-stops-short', false],
      ['Teo', 'expected-turn-in', false],
    ]);
    expect(new Set(rows.map(({ code }) => code))).toEqual(new Set(readingCode.options));
  });

  it('shows the lift of the clip from the side, whose turn nobody can see', async () => {
    const row = await api.ground.inPractice(product(GREYWATER), ({ em }) =>
      em.findOneOrFail(Reading, { code: 'not-measurable' }, { populate: ['result'] }),
    );
    const rep = row.result.unwrap()?.reps[0];
    expect(rep?.phases?.boundaries.footOff).toBeGreaterThan(0);
    const lifts = rep?.frames.flatMap(({ phase, lift }) => (phase === 'rise' ? [lift] : [])) ?? [];
    expect(lifts.length).toBeGreaterThan(10);
    expect(lifts).not.toContain(null);
    expect(Math.max(...lifts.map((lift) => lift ?? 0))).toBeGreaterThan(100);
  });

  it('takes the lift of one reading from the clip from the side, its turn from the front', async () => {
    const row = await api.ground.inPractice(product(GREYWATER), ({ em }) =>
      em.findOneOrFail(
        Reading,
        { code: 'early-turn-out', provisional: false },
        { populate: ['result'] },
      ),
    );
    const clips = await api.ground.inPractice(product(GREYWATER), ({ em }) =>
      em.find(Clip, { visit: row.visit.id }),
    );
    expect(clips.map(({ view }) => view).toSorted()).toEqual(['front', 'lifted-side']);
    const reps = row.result.unwrap()?.reps ?? [];
    const aside = reps.filter(({ used }) => !used);
    expect(reps.flatMap(({ used, liftFrom }) => (used ? [liftFrom] : []))).toEqual(
      aside.map(({ id }) => id),
    );
    expect(aside).toHaveLength(3);
    expect(aside.map(({ phases }) => phases?.boundaries.footOff ?? 0)).not.toContain(0);
  });

  it('gives each of its people something to do', async () => {
    const kinds = async (account: (typeof DEMO_ACCOUNTS)['coach']) => {
      const { body } = await (await api.as(await userOf(account))).get('/api/today').expect(200);
      return new Set((body.items as { kind: string }[]).map(({ kind }) => kind));
    };
    const coach = await kinds(DEMO_ACCOUNTS.coach);
    for (const kind of [
      'comment-open',
      'call-missing',
      'rep-unmarked',
      'clip-refused',
      'consent-lapses',
    ]) {
      expect(coach).toContain(kind);
    }
    expect(await kinds(DEMO_ACCOUNTS.supervisor)).toContain('to-review');
    expect(await kinds(DEMO_ACCOUNTS.owner)).toContain('consent-lapses');
  });

  it('hands one athlete a link that opens', async () => {
    const line = await demoReplayLine(api.ground);
    const token = /\/r\/(\S+)/.exec(line)?.[1] ?? '';
    const { body } = await api.nobody.get(`/api/r/${token}`).expect(200);
    expect(body).toMatchObject({ athleteGivenName: 'Mara', reading: { code: 'early-turn-out' } });
  });

  it('keeps its two practices apart', async () => {
    const foreign = await api.as(await userOf(DEMO_ACCOUNTS.foreignCoach));
    const list = await foreign.get('/api/athletes').expect(200);
    expect(list.body.items.map((row: { givenName: string }) => row.givenName)).toEqual(['Ash']);
    const clip = [...PLACED.keys()][0] ?? '';
    await foreign.get(`/api/clips/${clip}/bench`).expect(404);
  });

  it('is not doubled when its job runs again', async () => {
    const before = await api.ground.inPractice(product(PENNYWORT), ({ em }) =>
      em.execute<{ clips: number; reps: number }[]>(
        'select (select count(*)::int from clip) as clips, (select count(*)::int from rep) as reps',
      ),
    );
    await fillDemoJob.run({
      ground: api.ground,
      practiceId: PENNYWORT,
      payload: {},
      signal: new AbortController().signal,
    });
    const after = await api.ground.inPractice(product(PENNYWORT), ({ em }) =>
      em.execute(
        'select (select count(*)::int from clip) as clips, (select count(*)::int from rep) as reps',
      ),
    );
    expect(after).toEqual(before);
    expect(before).toEqual([{ clips: 1, reps: 2 }]);
  });
});

describe('making the demo', () => {
  it('is for an empty database alone', async () => {
    const used = await startApi();
    expect(await seedDemo(used.ground)).toBeNull();
    await used.close();
  });
});

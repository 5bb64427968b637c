import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { asJobs } from '#tests/support/as-jobs.ts';
import { type Api, startApi } from '#tests/support/api.ts';
import { product } from '../../db/in-practice.ts';
import { Athlete } from '../athletes/athlete.entity.ts';
import { makeAthlete, makeConsent } from '../athletes/athlete.factory.ts';
import { daysLater, today } from '../athletes/days.ts';
import { makeVisit } from '../visits/visit.factory.ts';
import { tidyJob } from './jobs/tidy.ts';

let api: Api;
let owner: Awaited<ReturnType<Api['as']>>;
beforeAll(async () => {
  api = await startApi();
  owner = await api.as(api.world.owner);
});
afterAll(() => api.close());

const inPractice = <T>(work: Parameters<typeof api.ground.inPractice<never, T>>[1]) =>
  api.ground.inPractice(product(api.world.practiceId) as never, work);
const present = async (): Promise<string[]> =>
  (await inPractice(({ em }) => em.find(Athlete, {}))).map(({ id }) => id).sort();
const preview = async (query = ''): Promise<{ id: string; why: string; on: string }[]> =>
  (await owner.get(`/api/practice/retention/preview${query}`).expect(200)).body.items.map(
    ({ athlete, why, on }: { athlete: { id: string }; why: string; on: string }) => ({
      id: athlete.id,
      why,
      on,
    }),
  );
const set = (keepMonths: number | null, withdrawalDays = 30) =>
  owner.put('/api/practice/retention').send({ keepMonths, withdrawalDays });
const run = () =>
  tidyJob.run({
    ground: api.ground,
    practiceId: api.world.practiceId,
    payload: { practice: api.world.practiceId },
    signal: new AbortController().signal,
  });
const practicesToTidy = async (): Promise<string[]> =>
  (await asJobs<{ practice_id: string }>(api, 'select * from practices_to_tidy()')).map(
    ({ practice_id: id }) => id,
  );

/** Of the last visit, or of the adding where there is none. */
const added = (daysAgo: number, { visit = true, withdrawnFor = null as number | null } = {}) =>
  inPractice(async ({ em }) => {
    const { coach } = api.world;
    const athlete = makeAthlete(em, { coach });
    athlete.createdAt = new Date(Date.now() - daysAgo * 86_400_000);
    if (withdrawnFor !== null) athlete.deletionDue = daysLater(today(), withdrawnFor);
    makeConsent(em, { athlete, recordedBy: coach });
    if (visit) {
      makeVisit(em, { athlete, coach, day: daysLater(today(), -daysAgo) });
      makeVisit(em, { athlete, coach, day: daysLater(today(), -daysAgo - 400) });
    }
    await em.flush();
    return athlete.id;
  });

beforeEach(async () => {
  await set(null).expect(200);
});

describe('the term', () => {
  it('is none at first: whatever its age, nobody is deleted', async () => {
    await added(3000);
    const before = await present();
    expect(await preview()).toEqual([]);
    expect(await practicesToTidy()).toEqual([]);
    await run();
    expect(await present()).toEqual(before);
  });

  it('deletes exactly those that the preview names, once', async () => {
    const old = await added(400);
    const oldWithout = await added(400, { visit: false });
    const young = await added(300);
    const due = await added(10, { withdrawnFor: 0 });
    const later = await added(10, { withdrawnFor: 1 });
    await set(12).expect(200);
    const named = (await preview()).map(({ id }) => id).sort();
    expect(named).toEqual(expect.arrayContaining([old, oldWithout, due].sort()));
    expect(named).not.toContain(young);
    expect(named).not.toContain(later);
    const before = await present();
    expect(await practicesToTidy()).toEqual([api.world.practiceId]);
    await run();
    expect(before.filter((id) => !named.includes(id))).toEqual(await present());
    const after = await present();
    await run();
    expect(await present()).toEqual(after);
    expect(await practicesToTidy()).toEqual([]);
    const { body } = await owner.get('/api/practice/retention').expect(200);
    const why = (id: string) =>
      body.erasures.find(({ athleteId }: { athleteId: string }) => athleteId === id)?.why;
    expect([why(old), why(oldWithout), why(due)]).toEqual(['term', 'term', 'withdrawn']);
  });

  it('is looked at before it is set, with the day on which each goes', async () => {
    const id = await added(300);
    const until = daysLater(today(), 365);
    expect(await preview(`?until=${until}`)).not.toContainEqual(expect.objectContaining({ id }));
    const [found] = (await preview(`?until=${until}&keepMonths=12`)).filter(
      (each) => each.id === id,
    );
    expect(found?.why).toBe('term');
    // twelve months and not 365 days
    const last = new Date(`${daysLater(today(), -300)}T00:00:00Z`);
    last.setUTCFullYear(last.getUTCFullYear() + 1);
    expect(found?.on).toBe(last.toISOString().slice(0, 10));
    await run();
    expect(await present()).toContain(id);
  });

  it('keeps whoever consents anew before the day', async () => {
    const id = await added(10, { withdrawnFor: 0 });
    const coach = await api.as(api.world.coach);
    await coach
      .post(`/api/athletes/${id}/consents`)
      .send({ givenBy: 'athlete', purposes: ['assessment'], validUntil: daysLater(today(), 90) })
      .expect(201);
    await run();
    expect(await present()).toContain(id);
  });

  it('is the owner’s alone, within its bounds', async () => {
    for (const who of ['coach', 'supervisor'] as const) {
      const agent = await api.as(api.world[who]);
      await agent.get('/api/practice/retention').expect(403);
      await agent.get('/api/practice/retention/preview').expect(403);
      await agent
        .put('/api/practice/retention')
        .send({ keepMonths: 1, withdrawalDays: 0 })
        .expect(403);
    }
    for (const months of [0, 601, 1.5]) await set(months).expect(422);
    await set(12, 366).expect(422);
    const foreign = await api.as(api.world.foreignOwner);
    const { body } = await foreign.get('/api/practice/retention').expect(200);
    expect(body).toEqual({ term: { keepMonths: null, withdrawalDays: 30 }, erasures: [] });
  });
});

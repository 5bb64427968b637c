import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { AthletePlan } from '#shared/contracts/athlete-plan.ts';
import type { Plan, PlanItem } from '#shared/contracts/plans.ts';
import { product } from '#server/db/in-practice.ts';
import { daysLater, today } from '#server/features/athletes/days.ts';
import { SEND_WAITING_MAIL } from '#server/features/waiting-mail/jobs/send-waiting-mail-type.ts';
import { JobOutbox } from '#server/jobs/job-outbox.entity.ts';
import { type Api, startApi } from '#tests/support/api.ts';
import { makePlanCase } from '#tests/support/plan-cases.ts';

type Agent = Awaited<ReturnType<Api['as']>>;
let api: Api;
let coach: Agent;
beforeAll(async () => {
  api = await startApi();
  coach = await api.as(api.world.coach);
});
afterAll(() => api.close());

const RETEST = daysLater(today(), 42);

/** A case whose plan could be given; of it, only the first two exercises. */
const ready = async () => {
  const made = await makePlanCase(api);
  const path = `/api/visits/${made.visitId}/sides/${made.side}/plan`;
  const { body: plan } = await coach.post(path).send({ from: 'call' }).expect(201);
  const items = (plan as Plan).items
    .slice(0, 2)
    .map(({ exercise, stage, side, dose, cue }: PlanItem) => ({
      ...{ exercise, stage, side, dose, cue },
      sideConfirmed: true,
    }));
  const { body } = await coach
    .patch(`/api/plans/${plan.id}`)
    .send({ version: 1, items, retestOn: RETEST, note: 'Slowly.' })
    .expect(200);
  return { ...made, plan: body as Plan };
};
const give = ({ id, version }: Plan) =>
  coach.post(`/api/plans/${id}/give`).send({ version }).expect(201);
const running = async () => {
  const made = await ready();
  await give(made.plan);
  return made;
};
const shown = async (token: string): Promise<AthletePlan | null> =>
  (await api.nobody.get(`/api/r/${token}`).expect(200)).body.plan;
const tick = (token: string, body: object) =>
  api.nobody
    .post(`/api/r/${token}/ticks`)
    .send({ exercise: 'foot-tripod', day: today(), done: true, ...body });
const pain = (token: string, body: object = {}) =>
  api.nobody.post(`/api/r/${token}/pain`).send({
    day: today(),
    level: 4,
    places: ['knee', 'knee', 'groin'],
    which: 'left',
    time: 'afterwards',
    exercise: 'supported-hinge',
    ...body,
  });
const planNow = async ({ id }: Plan): Promise<Plan> =>
  (await coach.get(`/api/plans/${id}`).expect(200)).body;

describe('an old link', () => {
  it('keeps the plan of its own visit, and says once another runs for the same leg', async () => {
    const old = await running();
    expect((await shown(old.token))?.newerGivenAt).toBeNull();
    const { body: visit } = await coach
      .post(`/api/athletes/${old.athleteId}/visits`)
      .send({})
      .expect(201);
    const path = `/api/visits/${visit.id}/sides/${old.side}`;
    await coach.post(`${path}/call`).send({ seen: 'early', confidence: 'sure' }).expect(201);
    const { body: made } = await coach.post(`${path}/plan`).send({ from: 'call' }).expect(201);
    const items = (made as Plan).items.slice(0, 1).map((item) => ({
      ...{ exercise: item.exercise, stage: item.stage, side: item.side, dose: item.dose },
      sideConfirmed: true,
    }));
    const { body: next } = await coach
      .patch(`/api/plans/${made.id}`)
      .send({ version: made.version, items, retestOn: RETEST })
      .expect(200);
    expect((await shown(old.token))?.newerGivenAt).toBeNull();
    await give(next as Plan);
    const then = await shown(old.token);
    expect(then?.plan?.items).toHaveLength(2);
    expect(then?.newerGivenAt).toMatch(/^\d{4}-\d\d-\d\dT/);
    // what was stopped is not to be done in its place
    await coach.post(`/api/plans/${made.id}/stop`).expect(201);
    expect((await shown(old.token))?.newerGivenAt).toBeNull();
  });
});

describe('a plan on a link', () => {
  it('is there once it was given, as it was given, until it is given anew or stopped', async () => {
    const { token, plan } = await ready();
    expect(await shown(token)).toBeNull();
    await give(plan);
    const first = await shown(token);
    expect(first?.plan).toMatchObject({ note: 'Slowly.', retestOn: RETEST });
    expect(first?.plan?.stop).toMatch(/^Stop on pain/);
    expect(first?.plan?.items[0]).toMatchObject({
      exercise: 'foot-tripod',
      name: 'Standing foot tripod',
      side: 'right',
      sideLines: expect.arrayContaining(['Stand on the right leg.']),
    });
    // nothing of what the coach alone has to know
    expect(JSON.stringify(first)).not.toMatch(/notWith|heldBack|decision|because|confidential/);
    const { body: changed } = await coach
      .patch(`/api/plans/${plan.id}`)
      .send({ version: plan.version, note: 'Slower.' })
      .expect(200);
    expect(changed.state).toBe('changed-since');
    expect((await shown(token))?.plan?.note).toBe('Slowly.');
    await give(changed);
    expect((await shown(token))?.plan?.note).toBe('Slower.');
    await coach.post(`/api/plans/${plan.id}/stop`).expect(201);
    expect(await shown(token)).toMatchObject({ plan: null, ticks: [] });
    const { given, state } = await planNow(plan);
    expect(state).toBe('stopped');
    expect(given.map(({ number, plan: content }) => [number, content?.note])).toEqual([
      [3, undefined],
      [2, 'Slower.'],
      [1, 'Slowly.'],
    ]);
    await give(changed);
    expect((await planNow(plan)).state).toBe('given');
  });

  it('is not on the link of another athlete', async () => {
    await running();
    const other = await makePlanCase(api);
    expect(await shown(other.token)).toBeNull();
    const refused = await tick(other.token, {}).expect(409);
    expect(refused.body.code).toBe('plan-not-running');
    await pain(other.token).expect(409);
  });
});

describe('ticks', () => {
  it('are added by the link and shown to the coach; the last said of a day holds', async () => {
    const { token, plan } = await running();
    const yesterday = daysLater(today(), -1);
    await tick(token, { day: yesterday }).expect(201);
    await tick(token, {}).expect(201);
    const { body } = await tick(token, { done: false }).expect(201);
    expect(body.ticks).toEqual([{ exercise: 'foot-tripod', day: yesterday }]);
    expect((await planNow(plan)).ticks).toEqual(body.ticks);
    expect((await shown(token))?.ticks).toEqual(body.ticks);
  });

  it('are for exercises of the plan and for days about now', async () => {
    const { token } = await running();
    for (const wrong of [
      { exercise: 'skip-drill' },
      { exercise: 'cartwheel' },
      { day: daysLater(today(), -8) },
      { day: daysLater(today(), 2) },
    ])
      await tick(token, wrong).expect(422);
  });

  it('end where a hand could not have made them', async () => {
    const { token } = await running();
    let last = 201;
    for (let n = 0; n < 61; n += 1) last = (await tick(token, {})).status;
    expect(last).toBe(429);
  });

  it('and answers about pain are only ever added: the product itself may not change them', async () => {
    for (const sql of [
      'update plan_tick set done = false',
      'delete from plan_tick',
      'update plan_pain set level = 0',
      'delete from plan_pain',
      'update given_plan set content = null',
    ])
      await expect(
        api.ground.inPractice(api.world.coach, ({ em }) => em.execute(sql)),
      ).rejects.toThrow(/permission denied/);
  });
});

describe('an answer about pain', () => {
  const todayOf = async (agent: Agent, plan: Plan) =>
    (await agent.get('/api/today').expect(200)).body.items.filter(
      (item: { kind: string; planId?: string }) =>
        item.kind === 'pain-reported' && item.planId === plan.id,
    );

  it('reaches the coach on Today and on the plan until somebody has looked', async () => {
    const { token, plan, athleteId } = await running();
    await pain(token, { level: 2, places: ['foot'] }).expect(204);
    await pain(token).expect(204);
    expect(await todayOf(coach, plan)).toMatchObject([
      { level: 4, places: ['knee', 'groin'], side: 'right', athlete: { id: athleteId } },
    ]);
    expect(await todayOf(await api.as(api.world.owner), plan)).toHaveLength(1);
    for (const who of [api.world.otherCoach, api.world.foreignOwner])
      expect(await todayOf(await api.as(who), plan)).toEqual([]);
    const { pain: said } = await planNow(plan);
    expect(said.map(({ level, seen }) => [level, seen])).toEqual([
      [4, null],
      [2, null],
    ]);
    await (await api.as(api.world.supervisor)).post(`/api/plans/${plan.id}/pain/seen`).expect(403);
    const { body } = await coach.post(`/api/plans/${plan.id}/pain/seen`).expect(200);
    expect(body.pain[0].seen.by.id).toBe(api.world.coach.id);
    expect(await todayOf(coach, plan)).toEqual([]);
    // the link itself never tells what was said
    expect(JSON.stringify(await shown(token))).not.toContain('groin');
  });

  /** Letters that were asked for since the last time, and are not written yet. */
  const lettersAsked = () =>
    api.ground.inPractice(product(api.world.practiceId), async ({ em }) => {
      await em.execute('update mail_choice set asked_at = null');
      const rows = await em.find(JobOutbox, { queue: SEND_WAITING_MAIL.queue });
      em.remove(rows);
      return rows.map(({ payload }) => payload);
    });

  it('is written about to the coach, once in a while, and never where nothing hurts', async () => {
    const { token, plan } = await running();
    await lettersAsked();
    await pain(token, { level: 0, places: [], exercise: null, time: null }).expect(204);
    expect(await lettersAsked()).toEqual([]);
    await pain(token).expect(204);
    await pain(token, { level: 7 }).expect(204);
    expect(await lettersAsked()).toEqual([
      {
        userId: api.world.coach.id,
        kind: 'pain',
        aboutId: plan.id,
        path: `/plans/${plan.id}#pain`,
      },
    ]);
  });

  it('of none is kept and troubles nobody', async () => {
    const { token, plan } = await running();
    await pain(token, { level: 0, places: [], exercise: null, time: null }).expect(204);
    expect(await todayOf(coach, plan)).toEqual([]);
    expect((await planNow(plan)).pain).toMatchObject([{ level: 0, places: [] }]);
  });

  it('says where, and a number that there is', async () => {
    const { token } = await running();
    for (const wrong of [
      { places: [] },
      { level: 11 },
      { level: 0 },
      { places: ['sacrum'] },
      { exercise: 'skip-drill' },
    ])
      await pain(token, wrong).expect(422);
  });
});

describe('a retest', () => {
  it('is due on Today from a week before, until the athlete was filmed again', async () => {
    const { plan, athleteId } = await running();
    const due = async () =>
      (await coach.get('/api/today').expect(200)).body.items.filter(
        (item: { kind: string; planId?: string }) =>
          item.kind === 'retest-due' && item.planId === plan.id,
      );
    expect(await due()).toEqual([]);
    const soon = daysLater(today(), 7);
    await coach
      .patch(`/api/plans/${plan.id}`)
      .send({ version: plan.version, retestOn: soon })
      .expect(200);
    expect(await due()).toMatchObject([{ due: soon, side: 'right' }]);
    await coach
      .post(`/api/athletes/${athleteId}/visits`)
      .send({ day: daysLater(today(), 1) })
      .expect(201);
    expect(await due()).toEqual([]);
  });
});

import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Plan, PlanItem, PlanStart } from '#shared/contracts/plans.ts';
import { type Api, startApi } from '#tests/support/api.ts';
import { type CaseOf, makePlanCase, type PlanCase } from '#tests/support/plan-cases.ts';
import { Call } from '../calls/call.entity.ts';
import { Reading } from '../readings/reading.entity.ts';
import { Review } from '../reviews/review.entity.ts';
import { SideReview } from '../reviews/side-review.entity.ts';

type Agent = Awaited<ReturnType<Api['as']>>;
let api: Api;
let coach: Agent;
beforeAll(async () => {
  api = await startApi();
  coach = await api.as(api.world.coach);
});
afterAll(() => api.close());

const startPath = ({ visitId, side }: PlanCase) => `/api/visits/${visitId}/sides/${side}/plan`;

/** A case with its plan. */
const planned = async (of: CaseOf = {}, from: 'reading' | 'call' = 'call') => {
  const made = await makePlanCase(api, of);
  const { body } = await coach.post(startPath(made)).send({ from }).expect(201);
  return { ...made, plan: body as Plan };
};
const bodyOf = ({ exercise, stage, side, sideConfirmed, dose, cue }: PlanItem) => ({
  exercise,
  stage,
  side,
  sideConfirmed,
  dose,
  cue,
});
const edit = (plan: Plan, change: object, by: Agent = coach) =>
  by.patch(`/api/plans/${plan.id}`).send({ version: plan.version, ...change });
const confirmed = (plan: Plan) =>
  plan.items.map((item) => ({ ...bodyOf(item), sideConfirmed: true }));

describe('what a plan starts from', () => {
  it('comes after the call by eye, and shows the rule with what it suggests', async () => {
    const uncalled = await makePlanCase(api, { seen: null });
    const early = await coach.get(startPath(uncalled)).expect(409);
    expect(early.body.code).toBe('call-first');
    const made = await makePlanCase(api, { reading: { code: 'holds-still' } });
    const { body } = await coach.get(startPath(made)).expect(200);
    expect(body).toMatchObject({
      planId: null,
      findings: [
        {
          basis: { kind: 'reading', code: 'holds-still', label: 'Holds still', carrier: null },
          suggestion: { kind: 'plan', rule: 'still' },
          hindrance: null,
        },
        { basis: { kind: 'call', seen: 'early' }, suggestion: { kind: 'plan', rule: 'early' } },
      ],
    });
  });

  it('splits the parts of a turn with both pointers alone', async () => {
    const parts = { pelvis: { value: 9, u: 1 }, thigh: { value: 1, u: 1 } };
    for (const [set, rule] of [
      ['belt+thigh', 'early-by-the-pelvis'],
      ['belt', 'early'],
    ]) {
      const reading = { code: 'early-turn-out', result: { set, figures: parts } } as const;
      const { plan } = await planned({ reading }, 'reading');
      expect(plan.rule).toBe(rule);
    }
  });

  it('is not a reading that is provisional, nor one that is not there', async () => {
    const reading = { code: 'early-turn-out', provisional: true } as const;
    const made = await makePlanCase(api, { reading });
    const { body } = await coach.get(startPath(made)).expect(200);
    expect(body.findings[0].hindrance).toBe('provisional');
    for (const of of [made, await makePlanCase(api)]) {
      const refused = await coach.post(startPath(of)).send({ from: 'reading' }).expect(409);
      expect(refused.body.code).toBe('reading-not-final');
    }
  });
});

describe('whether what it starts from is signed off', () => {
  const signOff = ({ visitId: visit, side }: PlanCase, kind: 'reading' | 'call') =>
    api.ground.inPractice(api.world.supervisor, async ({ em }) => {
      const about =
        kind === 'reading'
          ? { reading: await em.findOneOrFail(Reading, { visit }) }
          : { call: await em.findOneOrFail(Call, { visit }) };
      const by = api.world.supervisor.id;
      const last = em.create(Review, { visit, side, step: 'signed-off', reason: '', by, ...about });
      em.create(SideReview, { visit, side, last });
    });

  it('is said of the reading that was signed, and not of the call beside it', async () => {
    const made = await planned({ reading: { code: 'early-turn-out' } }, 'reading');
    expect(made.plan.signedOff).toBeNull();
    await signOff(made, 'reading');
    const { body } = await coach.get(`/api/plans/${made.plan.id}`).expect(200);
    expect(body.signedOff.by.id).toBe(api.world.supervisor.id);
    const start = await coach.get(startPath(made)).expect(200);
    const [reading, call] = (start.body as PlanStart).findings;
    expect(reading?.signedOff?.by.id).toBe(api.world.supervisor.id);
    expect(call?.signedOff).toBeNull();
  });

  it('is said of a call by eye where nothing was measured', async () => {
    const made = await planned();
    await signOff(made, 'call');
    const { body } = await coach.get(`/api/plans/${made.plan.id}`).expect(200);
    expect(body.signedOff.by.id).toBe(api.world.supervisor.id);
  });
});

describe('a plan', () => {
  it('has the exercises of its rule in stages, with their doses, sides to be confirmed', async () => {
    const { plan, ...made } = await planned({ side: 'left' });
    expect(plan).toMatchObject({ rule: 'early', state: 'draft', side: 'left', version: 1 });
    expect(plan.items.map(({ exercise, stage }) => `${stage} ${exercise}`)).toEqual([
      '1 foot-tripod',
      '1 supported-hinge',
      '2 half-kneeling-shift',
      '2 staggered-hinge',
      '3 single-leg-hinge',
      '3 hold-to-60',
    ]);
    for (const item of plan.items)
      expect(item).toMatchObject({ side: 'left', sideConfirmed: false, undecided: false });
    expect(plan.missing.join(' ')).toMatch(/Confirm the side.*Set the day of the retest/);
    const again = await coach.post(startPath(made)).send({ from: 'call' }).expect(409);
    expect(again.body.code).toBe('plan-there-already');
    expect((await coach.get(startPath(made))).body.planId).toBe(plan.id);
  });

  it('of what is not known is a retest, which takes no exercise', async () => {
    const { plan } = await planned({ reading: { code: 'cannot-tell' } }, 'reading');
    expect(plan).toMatchObject({ rule: null, items: [], missing: ['Set the day of the retest.'] });
    const other = await planned();
    const refused = await edit(plan, { items: confirmed(other.plan) }).expect(409);
    expect(refused.body.code).toBe('retest-first');
    const { body } = await edit(plan, { retestOn: '2999-01-01' }).expect(200);
    await coach.post(`/api/plans/${plan.id}/give`).send({ version: body.version }).expect(201);
    // what is found otherwise can be taken instead
    const { body: anew } = await coach
      .post(`/api/plans/${plan.id}/again`)
      .send({ from: 'call', version: body.version })
      .expect(200);
    expect(anew).toMatchObject({ rule: 'early', state: 'changed-since', retestOn: '2999-01-01' });
    expect(anew.items).toHaveLength(6);
  });

  it('is edited as a list: order, dose, side, cue, what is added and taken out', async () => {
    const { plan } = await planned();
    const [tripod, hinge] = confirmed(plan);
    const dose = { ...hinge?.dose, repetitions: null, holdSeconds: 20 };
    const items = [
      { ...hinge, dose, cue: ' Nose over the toes. ', side: 'left' },
      { ...tripod, exercise: 'split-squat', stage: 2 },
      tripod,
    ];
    const { body } = await edit(plan, { items, note: 'Slowly.' }).expect(200);
    expect(body.items.map((item: PlanItem) => item.exercise)).toEqual([
      'supported-hinge',
      'split-squat',
      'foot-tripod',
    ]);
    expect(body.items[0]).toMatchObject({ cue: 'Nose over the toes.', side: 'left', dose });
    expect(body).toMatchObject({ note: 'Slowly.', version: 2 });
  });

  it('is not written over unseen, and takes nothing that cannot be done', async () => {
    const { plan } = await planned();
    await edit(plan, { note: 'First.' }).expect(200);
    const late = await edit(plan, { note: 'Second.' }).expect(409);
    expect(late.body.code).toBe('edited-meanwhile');
    const now = { ...plan, version: 2 };
    const [item] = confirmed(plan);
    for (const items of [
      [item, item],
      [{ ...item, dose: { ...item?.dose, repetitions: 8 } }],
      [{ ...item, exercise: 'cartwheel' }],
    ])
      await edit(now, { items }).expect(422);
    expect((await coach.get(`/api/plans/${plan.id}`)).body.items).toHaveLength(6);
  });

  it('is the coach’s: the supervisor reads it, others see nothing', async () => {
    const { plan, athleteId } = await planned();
    const supervisor = await api.as(api.world.supervisor);
    await supervisor.get(`/api/plans/${plan.id}`).expect(200);
    await edit(plan, { note: 'x' }, supervisor).expect(403);
    await supervisor.post(`/api/plans/${plan.id}/stop`).expect(403);
    for (const who of [api.world.otherCoach, api.world.foreignCoach, api.world.foreignOwner]) {
      const agent = await api.as(who);
      await agent.get(`/api/plans/${plan.id}`).expect(404);
      await edit(plan, { note: 'x' }, agent).expect(404);
      await agent.get(`/api/athletes/${athleteId}/plans`).expect(404);
    }
    const owner = await api.as(api.world.owner);
    expect((await owner.get(`/api/athletes/${athleteId}/plans`)).body.items).toMatchObject([
      { id: plan.id, state: 'draft', exercises: 6, painUnseen: 0 },
    ]);
  });

  it('is closed once the consent to filming was withdrawn', async () => {
    const { plan, athleteId } = await planned();
    await coach
      .post(`/api/athletes/${athleteId}/withdrawals`)
      .send({ purposes: ['assessment'] })
      .expect(200);
    const closed = await coach.get(`/api/plans/${plan.id}`).expect(403);
    expect(closed.body.code).toBe('consent-withdrawn');
    await edit(plan, { note: 'x' }).expect(403);
  });
});

describe('what the safety check holds back', () => {
  const held = (plan: Plan) =>
    plan.items.filter(({ heldBack }) => heldBack.length > 0).map(({ exercise }) => exercise);
  const withReason = (plan: Plan, exercise: string, despite: string | null = 'Seen and agreed.') =>
    confirmed(plan).map((item) => (item.exercise === exercise ? { ...item, despite } : item));

  it('is said with its reason, and has to be decided before anything is given', async () => {
    const { plan } = await planned({ yes: ['vertigo-or-dizziness'] });
    expect(held(plan)).toEqual(['single-leg-hinge', 'hold-to-60']);
    expect(plan.items.at(-1)).toMatchObject({
      heldBack: ['vertigo-or-dizziness'],
      undecided: true,
      mayNot: null,
    });
    const { body } = await edit(plan, {
      items: withReason(plan, 'hold-to-60'),
      retestOn: '2999-01-01',
    }).expect(200);
    expect(body.items.at(-1)).toMatchObject({
      undecided: false,
      decision: {
        reason: 'Seen and agreed.',
        answers: ['vertigo-or-dizziness'],
        by: { id: api.world.coach.id },
      },
    });
    expect(body.missing).toEqual([
      'Decide about what is held back, or take it out: Single-leg hinge.',
    ]);
    const refused = await coach
      .post(`/api/plans/${plan.id}/give`)
      .send({ version: body.version })
      .expect(409);
    expect(refused.body).toMatchObject({ code: 'plan-not-ready' });
    expect(refused.body.detail).toContain('Single-leg hinge');
    // an edit of something else leaves the decision; taking it back opens it again
    const kept = await edit(body, { items: confirmed(body) }).expect(200);
    expect(kept.body.items.at(-1).undecided).toBe(false);
    const open = await edit(kept.body, { items: withReason(body, 'hold-to-60', null) });
    expect(open.body.items.at(-1)).toMatchObject({ undecided: true, decision: null });
  });

  it('is asked about anew when another answer stands against it', async () => {
    const { plan, visitId } = await planned({ yes: ['vertigo-or-dizziness'] });
    await edit(plan, { items: withReason(plan, 'hold-to-60') }).expect(200);
    const { body } = await coach.get(`/api/visits/${visitId}`);
    const answers = { ...body.visit.safety.answers, 'nerve-symptoms': true };
    await coach
      .put(`/api/visits/${visitId}/safety`)
      .send({ answers, supportWithinReach: true, knowsWhenToStop: true, clearedBy: 'Dr Alder' })
      .expect(200);
    const now = (await coach.get(`/api/plans/${plan.id}`)).body as Plan;
    expect(now.items.at(-1)).toMatchObject({
      heldBack: ['vertigo-or-dizziness', 'nerve-symptoms'],
      undecided: true,
    });
  });

  it.each([
    ['what was never asked', { yes: null }, 'ask-first'],
    ['a limit that somebody else set', { yes: ['recent-surgery-or-fracture'] }, 'needs-clearance'],
  ] as const)('is not passed over by a reason: %s', async (_, of, mayNot) => {
    const { plan } = await planned(of);
    expect(plan.items.at(-1)?.mayNot).toBe(mayNot);
    const refused = await edit(plan, { items: withReason(plan, 'hold-to-60') }).expect(409);
    expect(refused.body.code).toBe('held-back');
  });

  it('may be used where whoever set the limit has cleared it', async () => {
    const yes = ['recent-surgery-or-fracture'] as const;
    const { plan } = await planned({ yes, clearedBy: 'Dr Alder, 1 March' });
    await edit(plan, { items: withReason(plan, 'hold-to-60') }).expect(200);
    // a reason is a sentence
    await edit(plan, { items: withReason(plan, 'hold-to-60', 'ok') }).expect(422);
  });
});

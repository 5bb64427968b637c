import * as z from 'zod';
import { dose, exerciseId, givenPlan, painAnswer, tick } from './athlete-plan.ts';
import { seen } from './calls.ts';
import { day, id, moment, personRef, side, text, version } from './primitives.ts';
import { readingCode } from './readings.ts';
import { json, route } from './route.ts';
import { safetyQuestion } from './visits.ts';

/** What a plan starts from, as it stood when it was made. */
export const planBasis = z
  .discriminatedUnion('kind', [
    z.object({
      kind: z.literal('reading'),
      code: readingCode,
      label: z.string(),
      /** Which part of the turn is the larger one beyond doubt; only both pointers tell. */
      carrier: z.enum(['pelvis', 'thigh']).nullable(),
    }),
    z.object({ kind: z.literal('call'), seen }),
  ])
  .meta({ id: 'PlanBasis' });
export type PlanBasis = z.infer<typeof planBasis>;

const suggestion = z
  .discriminatedUnion('kind', [
    z.object({
      kind: z.literal('plan'),
      rule: z.string(),
      because: z.string(),
      exercises: z.array(z.object({ exercise: exerciseId, stage: z.int() })),
    }),
    z.object({ kind: z.literal('retest'), because: z.string() }),
  ])
  .meta({ id: 'Suggestion' });
export type Suggestion = z.infer<typeof suggestion>;

/** A reviewer's word on what a plan stands on. */
const signedOff = z.object({ by: personRef, at: moment }).meta({ id: 'SignedOff' });
export type SignedOff = z.infer<typeof signedOff>;

/** One thing that a plan could start from, with what the rules make of it. */
export const finding = z
  .object({
    basis: planBasis,
    suggestion,
    /** Why no plan can start from it now; null where one can. */
    hindrance: z.enum(['provisional', 'being-made-anew']).nullable(),
    signedOff: signedOff.nullable(),
  })
  .meta({ id: 'Finding' });
export type Finding = z.infer<typeof finding>;

/** The last safety check of the athlete, on whichever visit it was. */
export const lastSafety = z
  .object({
    visitId: id,
    day: z.iso.date(),
    answers: z.partialRecord(safetyQuestion, z.boolean()),
    clearedBy: z.string().nullable(),
  })
  .meta({ id: 'LastSafety' });
export type LastSafety = z.infer<typeof lastSafety>;

const ofVisit = {
  visit: z.object({ id, day: z.iso.date() }),
  athlete: personRef.extend({ cautions: z.string() }),
  /** The athlete's coach. */
  coachId: id,
  side,
  safety: lastSafety.nullable(),
};

export const planStart = z
  .object({ ...ofVisit, planId: id.nullable(), findings: z.array(finding) })
  .meta({ id: 'PlanStart' });
export type PlanStart = z.infer<typeof planStart>;

/** Why an exercise is used although it is held back. */
const decision = z.object({
  reason: z.string(),
  answers: z.array(safetyQuestion),
  by: personRef,
  at: moment,
});

export const planItem = z
  .object({
    exercise: exerciseId,
    stage: z.int(),
    side,
    sideConfirmed: z.boolean(),
    dose,
    cue: z.string(),
    /** Answers of the last safety check that stand against it, or questions that were not answered. */
    heldBack: z.array(safetyQuestion),
    /** Why the coach may not decide to use it all the same; null where nothing forbids that. */
    mayNot: z.enum(['ask-first', 'needs-clearance']).nullable(),
    /** True while somebody has to decide about it. */
    undecided: z.boolean(),
    decision: decision.nullable(),
  })
  .meta({ id: 'PlanItem' });
export type PlanItem = z.infer<typeof planItem>;

export const planPain = painAnswer
  .extend({ id, at: moment, seen: z.object({ by: personRef, at: moment }).nullable() })
  .meta({ id: 'PlanPain' });
export type PlanPain = z.infer<typeof planPain>;

const planState = z.enum(['draft', 'given', 'changed-since', 'stopped']).meta({ id: 'PlanState' });
export type PlanState = z.infer<typeof planState>;

export const plan = z
  .object({
    id,
    ...ofVisit,
    basis: planBasis,
    /** Null: nobody has signed off what it stands on. */
    signedOff: signedOff.nullable(),
    /** The rule that made it; null where what was found leads to a retest and no exercise. */
    rule: z.string().nullable(),
    because: z.string(),
    items: z.array(planItem),
    note: z.string(),
    retestOn: day.nullable(),
    state: planState,
    /** What still keeps it from being given, in words. */
    missing: z.array(z.string()),
    /** Every time it was given or stopped, newest first. */
    given: z.array(
      z.object({
        number: z.int(),
        at: moment,
        by: personRef,
        /** Null: it was stopped. */
        plan: givenPlan.nullable(),
      }),
    ),
    ticks: z.array(tick),
    pain: z.array(planPain),
    /** Replay links of this side that open now. */
    liveLinks: z.int(),
    /** What is found now, where that is something else than what it was made from. */
    findings: z.array(finding),
    madeBy: personRef,
    madeAt: moment,
    version,
  })
  .meta({ id: 'Plan' });
export type Plan = z.infer<typeof plan>;

export const planRow = z
  .object({
    id,
    visit: z.object({ id, day: z.iso.date() }),
    side,
    state: planState,
    exercises: z.int(),
    retest: z.boolean(),
    retestOn: day.nullable(),
    /** Answers of some pain that nobody has looked at. */
    painUnseen: z.int(),
    ticksThisWeek: z.int(),
  })
  .meta({ id: 'PlanRow' });
export type PlanRow = z.infer<typeof planRow>;

const basisChoice = z.enum(['reading', 'call']);
export const planMake = z.object({ from: basisChoice }).meta({ id: 'PlanMake' });
export const planAgain = z.object({ from: basisChoice, version }).meta({ id: 'PlanAgain' });

export const planItemBody = z
  .object({
    exercise: exerciseId,
    stage: z.int().min(1).max(6),
    side,
    sideConfirmed: z.boolean(),
    dose,
    cue: text(400, 0).default(''),
    /**
     * Why it is used although it is held back. Left out: as decided before; null: not decided any more. A decision
     * holds for the answers that stood against it when it was made.
     */
    despite: text(400, 10).nullable().optional(),
  })
  .meta({ id: 'PlanItemBody' });

export const planEdit = z
  .object({
    version,
    /** The whole list in its order: what is not in it is taken out. */
    items: z
      .array(planItemBody)
      .max(20, 'At most 20 exercises.')
      .refine((items) => new Set(items.map(({ exercise }) => exercise)).size === items.length, {
        message: 'An exercise stands in a plan once.',
      })
      .optional(),
    note: text(2000, 0).optional(),
    retestOn: day.nullable().optional(),
  })
  .meta({ id: 'PlanEdit' });

const params = z.object({ id });
const sideParams = z.object({ id, side });
const changes = ['not-found', 'not-allowed', 'edited-meanwhile'] as const;

export const planRoutes = {
  planStart: route({
    method: 'get',
    path: '/api/visits/:id/sides/:side/plan',
    summary: 'What a plan of this side could start from, and what the rules suggest for each.',
    audience: 'staff',
    params: sideParams,
    status: 200,
    answer: json(planStart),
    problems: ['not-found', 'call-first'],
  }),
  makePlan: route({
    method: 'post',
    path: '/api/visits/:id/sides/:side/plan',
    summary: 'Make the plan of a side from its final reading or from its first call by eye.',
    audience: 'staff',
    params: sideParams,
    body: planMake,
    status: 201,
    answer: json(plan),
    problems: ['not-found', 'not-allowed', 'call-first', 'reading-not-final', 'plan-there-already'],
  }),
  listPlans: route({
    method: 'get',
    path: '/api/athletes/:id/plans',
    summary: 'The plans of an athlete, newest visit first.',
    audience: 'staff',
    params,
    status: 200,
    answer: json(z.object({ items: z.array(planRow) })),
    problems: ['not-found'],
  }),
  plan: route({
    method: 'get',
    path: '/api/plans/:id',
    summary: 'One plan with what the athlete answered.',
    audience: 'staff',
    params,
    status: 200,
    answer: json(plan),
    problems: ['not-found'],
  }),
  givePlan: route({
    method: 'post',
    path: '/api/plans/:id/give',
    summary: 'Give the plan as it stands to the athlete. What was given before is kept.',
    audience: 'staff',
    params,
    body: z.object({ version }).meta({ id: 'PlanGive' }),
    status: 201,
    answer: json(plan),
    problems: [...changes, 'plan-not-ready'],
  }),
  stopPlan: route({
    method: 'post',
    path: '/api/plans/:id/stop',
    summary: 'Stop a plan: the athlete’s page says that nothing of it is to be done any more.',
    audience: 'staff',
    params,
    status: 201,
    answer: json(plan),
    problems: ['not-found', 'not-allowed'],
  }),
  seePain: route({
    method: 'post',
    path: '/api/plans/:id/pain/seen',
    summary: 'Say that the answers about pain were looked at.',
    audience: 'staff',
    params,
    status: 200,
    answer: json(plan),
    problems: ['not-found', 'not-allowed'],
  }),
  editPlan: route({
    method: 'patch',
    path: '/api/plans/:id',
    summary: 'Change exercises, order, dose, side, note and the day of the retest.',
    audience: 'staff',
    params,
    body: planEdit,
    status: 200,
    answer: json(plan),
    problems: [...changes, 'retest-first', 'held-back'],
  }),
  planAgain: route({
    method: 'post',
    path: '/api/plans/:id/again',
    summary: 'Base a plan on what is found now; its exercises are suggested anew.',
    audience: 'staff',
    params,
    body: planAgain,
    status: 200,
    answer: json(plan),
    problems: [...changes, 'call-first', 'reading-not-final'],
  }),
};

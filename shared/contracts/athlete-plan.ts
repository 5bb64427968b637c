import * as z from 'zod';
import { EXERCISES, type ExerciseId } from '#shared/plan/library.ts';
import { day, moment, side } from './primitives.ts';
import { json, none, route } from './route.ts';

const EXERCISE_IDS = EXERCISES.map(({ id }) => id) as [ExerciseId, ...ExerciseId[]];
export const exerciseId = z.enum(EXERCISE_IDS).meta({ id: 'ExerciseId' });

/** How much: either repetitions or seconds of holding. */
export const dose = z
  .object({
    sets: z.int('A whole number.').min(1, 'At least 1.').max(10, 'At most 10.'),
    repetitions: z.int('A whole number.').min(1, 'At least 1.').max(60, 'At most 60.').nullable(),
    holdSeconds: z
      .int('A whole number.')
      .min(1, 'At least 1.')
      .max(300, 'At most 300 seconds.')
      .nullable(),
    restSeconds: z.int('A whole number.').min(0, 'At least 0.').max(600, 'At most 600 seconds.'),
    daysPerWeek: z.int('A whole number.').min(1, 'At least 1.').max(7, 'At most 7 days.'),
  })
  .refine(({ repetitions, holdSeconds }) => (repetitions === null) !== (holdSeconds === null), {
    path: ['repetitions'],
    message: 'Write either repetitions or seconds of holding.',
  })
  .meta({ id: 'Dose' });
export type Dose = z.infer<typeof dose>;

/** One exercise as the athlete got it: words as they were on that day. */
export const athletePlanItem = z
  .object({
    exercise: exerciseId,
    name: z.string(),
    stage: z.int(),
    /** The leg that the exercise is for; drawings of the left are mirrored. */
    side,
    purpose: z.string(),
    setUp: z.array(z.string()),
    sideLines: z.array(z.string()),
    foot: z.string(),
    cues: z.array(z.string()),
    /** The coach's own cue. */
    cue: z.string(),
    dose,
    easier: z.string(),
    harder: z.string(),
    goOnWhen: z.array(z.string()),
    goBackWhen: z.array(z.string()),
    notWhen: z.array(z.string()),
  })
  .meta({ id: 'AthletePlanItem' });
export type AthletePlanItem = z.infer<typeof athletePlanItem>;

/** What was given to the athlete on one day, as it was. */
export const givenPlan = z
  .object({
    items: z.array(athletePlanItem),
    note: z.string(),
    retestOn: day,
    /** When to stop, said with every plan. */
    stop: z.string(),
  })
  .meta({ id: 'GivenPlan' });
export type GivenPlan = z.infer<typeof givenPlan>;

export const tick = z.object({ exercise: exerciseId, day }).meta({ id: 'Tick' });
export type Tick = z.infer<typeof tick>;

/** The plan on a replay; `plan` is null once it was stopped: nothing of it is to be done any more. */
export const athletePlan = z
  .object({
    givenAt: moment,
    plan: givenPlan.nullable(),
    ticks: z.array(tick),
    /** When another plan for this leg was given, after another visit; null where this is the newest. */
    newerGivenAt: moment.nullable(),
  })
  .meta({ id: 'AthletePlan' });
export type AthletePlan = z.infer<typeof athletePlan>;

/** Where it hurts, in plain words and not in those of a diagnosis. */
export const PAIN_PLACES = [
  'back',
  'groin',
  'hip-front',
  'hip-side',
  'buttock',
  'thigh-front',
  'thigh-back',
  'knee',
  'lower-leg',
  'ankle',
  'foot',
  'elsewhere',
] as const;
export const painPlace = z.enum(PAIN_PLACES).meta({ id: 'PainPlace' });
export type PainPlace = z.infer<typeof painPlace>;

export const PAIN_TIMES = ['while-doing-it', 'afterwards', 'next-day', 'always'] as const;

const painFields = {
  day,
  /** 0: no pain; 10: the worst that can be thought of. */
  level: z.int('Choose a number from 0 to 10.').min(0).max(10),
  places: z.array(painPlace).max(PAIN_PLACES.length),
  which: z.enum(['left', 'right', 'both']).nullable(),
  time: z.enum(PAIN_TIMES).nullable(),
  /** What it hurt at; null where at none, or not known. */
  exercise: exerciseId.nullable(),
};

export const painBody = z
  .object(painFields)
  .refine(({ level, places }) => level === 0 || places.length > 0, {
    path: ['places'],
    message: 'Say where it hurts.',
  })
  .refine(({ level, places }) => level > 0 || places.length === 0, {
    path: ['places'],
    message: 'Leave out places where nothing hurts.',
  })
  .meta({ id: 'PainBody' });
export type PainBody = z.infer<typeof painBody>;
export const painAnswer = z.object(painFields).meta({ id: 'PainAnswer' });

export const tickBody = z
  .object({ exercise: exerciseId, day, done: z.boolean() })
  .meta({ id: 'TickBody' });

export type TickBody = z.infer<typeof tickBody>;

/** 256 random bits, base64url. */
const params = z.object({ token: z.string().regex(/^[A-Za-z0-9_-]{43}$/) });

/** All that a link may add. */
export const athletePlanRoutes = {
  tickExercise: route({
    method: 'post',
    path: '/api/r/:token/ticks',
    summary:
      'Say that an exercise was done on a day, or that this was a slip. Every answer is kept.',
    audience: 'link',
    params,
    body: tickBody,
    status: 201,
    answer: json(z.object({ ticks: z.array(tick) }).meta({ id: 'Ticks' })),
    problems: ['not-found', 'pass-phrase-needed', 'plan-not-running', 'too-many-tries'],
  }),
  answerPain: route({
    method: 'post',
    path: '/api/r/:token/pain',
    summary: 'Say how much something hurts and where; the coach is told.',
    audience: 'link',
    params,
    body: painBody,
    status: 204,
    answer: none,
    problems: ['not-found', 'pass-phrase-needed', 'plan-not-running', 'too-many-tries'],
  }),
};

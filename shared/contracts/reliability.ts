import * as z from 'zod';
import { personRef } from './primitives.ts';
import { json, route } from './route.ts';
import { markRepeat, secondMarkingSummary } from './second-markings.ts';

const known = z.number().nullable();

/** Why a figure is not there: too few pairs, or nothing differs. */
export const whyUnknown = z.enum(['too-few', 'all-alike']).nullable().meta({ id: 'WhyUnknown' });

const icc = z
  .object({ value: z.number(), low: z.number(), high: z.number() })
  .nullable()
  .meta({ id: 'Icc', description: 'Intraclass correlation with its 95 % interval.' });

/** How well a value in degrees repeats over frames measured twice. */
export const valueAgreement = z
  .object({
    pairs: z.int(),
    why: whyUnknown,
    oneWay: icc,
    random: icc,
    fixed: icc,
    /** Of the mean of both markings: (1,2), (2,2), (3,2). */
    ofMeans: z.object({ oneWay: z.number(), random: z.number(), fixed: z.number() }).nullable(),
    sem: known,
    mdc95: known,
    /** √(Σd²/2n). */
    typical: known,
    limits: z
      .object({
        bias: z.number(),
        sd: z.number(),
        biasLow: z.number(),
        biasHigh: z.number(),
        low: z.number(),
        high: z.number(),
      })
      .nullable(),
    /** Mean of both against first less second. */
    points: z.array(z.object({ mean: z.number(), difference: z.number() })),
  })
  .meta({ id: 'ValueAgreement' });
export type ValueAgreementShape = z.infer<typeof valueAgreement>;

/** How far two judges agree beyond chance (Cohen’s kappa). */
export const answerAgreement = z
  .object({ pairs: z.int(), same: z.int(), kappa: known, why: whyUnknown })
  .meta({ id: 'AnswerAgreement' });
export type AnswerAgreementShape = z.infer<typeof answerAgreement>;

/** Frames that one person marked first and one person marked again: the same one, or two. */
export const markingPair = z
  .object({
    first: personRef,
    second: personRef,
    repeat: markRepeat,
    lift: valueAgreement,
    turn: valueAgreement,
    /** Readings of the same frames by each marking. */
    readings: answerAgreement,
  })
  .meta({ id: 'MarkingPair' });
export type MarkingPair = z.infer<typeof markingPair>;

/** The marking error that new readings of a person’s marks are made with. */
export const ownMarkError = z
  .object({
    person: personRef,
    /** Px of the source. */
    px: z.number(),
    /** 0: the assumed error. */
    fromFrames: z.int(),
    /** Frames this person has marked twice so far. */
    frames: z.int(),
  })
  .meta({ id: 'OwnMarkError' });

export const reliability = z
  .object({
    /** Everybody whose figures one may see. */
    people: z.array(ownMarkError),
    /** Frames from which a person’s own error replaces the assumed one. */
    least: z.int(),
    /** Each person with themselves. */
    repeats: z.array(markingPair),
    /** Two different people. */
    between: z.array(markingPair),
    /** Second markings that wait for the one who asks. */
    waiting: z.array(z.object({ summary: secondMarkingSummary, athlete: personRef })),
    /** All repeats in sight together; null where there is none. */
    practice: markingPair.omit({ first: true, second: true }).nullable(),
    /** First calls by eye of two people on the same side of a visit. */
    calls: z.array(z.object({ one: personRef, other: personRef, agreement: answerAgreement })),
  })
  .meta({ id: 'Reliability' });
export type Reliability = z.infer<typeof reliability>;

export const reliabilityRoutes = {
  reliability: route({
    method: 'get',
    path: '/api/reliability',
    summary: 'How well marks, values, readings and calls by eye repeat.',
    audience: 'staff',
    status: 200,
    answer: json(reliability),
  }),
};

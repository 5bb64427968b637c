import * as z from 'zod';
import { call } from './calls.ts';
import { id, moment, personRef, side } from './primitives.ts';
import { protocolRef } from './protocol.ts';
import { json, route } from './route.ts';
import { tieFault } from './reps.ts';
import { readingResult } from './reading-result.ts';

export const readingCode = z
  .enum([
    'early-turn-out',
    'expected-turn-in',
    'holds-still',
    'cannot-tell',
    'lift-stops-short',
    'not-measurable',
  ])
  .meta({ id: 'ReadingCode' });
export type ReadingCode = z.infer<typeof readingCode>;

/** The words for each reading; `early-turn-out` before the lower gate carries its own. */
export const READING_LABELS = {
  'early-turn-out': 'Turns out early',
  'expected-turn-in': 'Turns in on time',
  'holds-still': 'Holds still',
  'cannot-tell': 'Can’t tell yet',
  'lift-stops-short': 'Lift stops short',
  'not-measurable': 'Not measurable from these landmarks',
} as const satisfies Record<ReadingCode, string>;

/** `Turns out early, before 60°`: what turns out already before the lower gate says so. */
export const readingLabel = (code: ReadingCode, before60: boolean, gateFrom: number): string =>
  code === 'early-turn-out' && before60
    ? `${READING_LABELS[code]}, before ${gateFrom}°`
    : READING_LABELS[code];

/** The error of one anatomical mark that a reading was made with. */
export const markErrorShape = z
  .object({
    /** Px of the source. */
    px: z.number(),
    /** Frames marked twice that it rests on; 0: assumed. */
    frames: z.int(),
  })
  .meta({ id: 'MarkError' });
export type MarkErrorShape = z.infer<typeof markErrorShape>;

/** A reading as it was made: never changed, followed by another when its inputs change. */
export const reading = z
  .object({
    id,
    visitId: id,
    side,
    engine: z.int(),
    /** SHA-256 of the canonical inputs, hex; the seed is its first 32 bits. */
    inputHash: z.string(),
    seed: z.int(),
    code: readingCode,
    label: z.string(),
    /** Turn from gate to gate, degrees, external positive; null where nothing could be fitted. */
    change: z.number().nullable(),
    /** 1.96 u_c, degrees. */
    plusMinus: z.number().nullable(),
    /** u_c, degrees. */
    u: z.number().nullable(),
    /** Probability that the turn is external beyond 1°. */
    pEarly: z.number().nullable(),
    /** The smallest early turn that is found nine times in ten, degrees. */
    smallestFound: z.number().nullable(),
    /** True while it rests on tracked marks that nobody has looked at; then it cannot be signed off. */
    provisional: z.boolean(),
    /** The 'planted thigh turns little' assumption was on. */
    assumption: z.boolean(),
    markError: markErrorShape,
    /** The version of the practice’s protocol that it was made with. */
    protocol: protocolRef,
    /** Marks of its reps, how many of them were followed by the computer, and how many of those a person looked at. */
    marking: z.object({ marks: z.int(), followed: z.int(), looked: z.int() }),
    result: readingResult,
    /** What the rep ids of `result` are called on the page. */
    reps: z.array(
      z.object({
        id,
        clipId: id,
        clipName: z.string(),
        number: z.int(),
        excluded: z.string().nullable(),
        /** Rep of a side clip said to be filmed at the same time, and why its lift is not taken. */
        liftFrom: id.nullable(),
        tieFault: tieFault.nullable(),
      }),
    ),
    by: personRef,
    at: moment,
  })
  .meta({ id: 'Reading' });
export type Reading = z.infer<typeof reading>;

export const readingSummary = reading
  .pick({
    id: true,
    engine: true,
    code: true,
    label: true,
    change: true,
    plusMinus: true,
    markError: true,
    protocol: true,
    by: true,
    at: true,
  })
  .meta({ id: 'ReadingSummary' });

/** Two sides, told apart only beyond 1.96 × their joint uncertainty. */
export const sidesCompared = z
  .object({ difference: z.number(), plusMinus: z.number(), differ: z.boolean() })
  .meta({ id: 'SidesCompared' });

export const sidePage = z
  .object({
    visit: z.object({ id, day: z.iso.date() }),
    athlete: personRef,
    side,
    calls: z.array(call),
    /** Null where no rep of this side has marks. */
    reading: reading.nullable(),
    /**
     * The marking error that a reading made now would take, where the stored one was made with another: it stays as
     * it is until somebody asks for it anew.
     */
    newerMarkError: markErrorShape.nullable(),
    /** The same of the protocol: the version that would now be taken, where it reads otherwise. */
    newerProtocol: protocolRef.nullable(),
    /** The same of the engine. */
    newerEngine: z.int().nullable(),
    history: z.array(readingSummary),
    /** The other side of this visit, once it too has a call; null where there is nothing. */
    otherSide: z.object({ side, reading: reading.nullable(), calls: z.array(call) }).nullable(),
    compared: sidesCompared.nullable(),
    /** How often this coach's eye and the measurement agreed, over all visits with both. */
    agreement: z.object({ coach: personRef, agreed: z.int(), of: z.int() }).nullable(),
    assumption: z.boolean(),
  })
  .meta({ id: 'SidePage' });
export type SidePage = z.infer<typeof sidePage>;

const params = z.object({ id, side });

export const readingRoutes = {
  sideReading: route({
    method: 'get',
    path: '/api/visits/:id/sides/:side/reading',
    summary: 'What the reps of one side say together, derived from the stored marks.',
    audience: 'staff',
    params,
    status: 200,
    answer: json(sidePage),
    problems: ['not-found', 'call-first'],
  }),
  renewReading: route({
    method: 'post',
    path: '/api/visits/:id/sides/:side/reading',
    summary:
      'Make the reading of a side anew with the marking error and the protocol known now; both are kept.',
    audience: 'staff',
    params,
    status: 200,
    answer: json(sidePage),
    problems: ['not-found', 'not-allowed', 'call-first'],
  }),
  setAssumption: route({
    method: 'put',
    path: '/api/visits/:id/sides/:side/assumption',
    summary: 'Take the planted thigh as turning little, or stop doing so; stored and shown.',
    audience: 'staff',
    params,
    body: z.object({ on: z.boolean() }).meta({ id: 'AssumptionBody' }),
    status: 200,
    answer: json(sidePage),
    problems: ['not-found', 'not-allowed', 'call-first'],
  }),
};

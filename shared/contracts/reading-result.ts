import * as z from 'zod';
import type { Degrees } from '#shared/geometry/units.ts';
import { ENGINES } from '#shared/reading/engine.ts';
import type { ReadingResult } from '#shared/reading/types.ts';
import { READING_CODES } from '#shared/reading/types.ts';
import type { FrameIndex, Milliseconds } from '#shared/timing/units.ts';
import { quantity, readonlyList, side } from './primitives.ts';
import { readingRules } from './protocol.ts';
import { missing, placedWarning, readingSet, reason, repFault, settle } from './reading-reasons.ts';

const angle = quantity<Degrees>('Degrees.');
const time = quantity<Milliseconds>('Milliseconds.');
const share = z.number().min(0).max(1);

const change = z
  .object({ value: angle, u: angle })
  .meta({ id: 'Change', description: 'Degrees, external positive, and its standard uncertainty.' });

const figures = z
  .object({
    d: angle,
    uC: angle,
    uR: angle,
    uS: angle,
    uC0: angle,
    nu: z.number(),
    m: angle,
    sM: angle,
    pEarly: share,
    pIn: share,
    pFlat: share,
    pBefore60: share,
    pNotBack: share,
    mdt90: angle,
    pelvis: change,
    thigh: change,
    pre: change,
    lambda: share.nullable(),
  })
  .meta({
    id: 'ReadingFigures',
    description: 'Of all used reps together, from gate to gate; `u…` are standard uncertainties.',
  });

const curvePoint = z
  .object({ lift: angle, turn: angle, low: angle, high: angle, carried: z.boolean() })
  .meta({ id: 'CurvePoint', description: '`low` to `high` is the 95 % band.' });

const fit = z
  .object({
    beta: z.tuple([z.number(), z.number(), z.number(), z.number()]).readonly(),
    change,
    pelvis: change,
    thigh: change,
    pre: change,
    sFit: z.number(),
    used: z.int(),
    nu: z.number(),
    share,
  })
  .meta({
    id: 'RepFit',
    description: 'The fit over one rise; `share` is its part in the reading.',
  });

const phase = z.enum(['quiet', 'between', 'rise', 'lower']);

const courseFrame = z
  .object({
    frame: quantity<FrameIndex>('Frame of the clip, from 0.'),
    time,
    phase,
    lift: angle.nullable(),
    liftHalfWidth: angle.nullable(),
    turn: angle.nullable(),
    turnHalfWidth: angle.nullable(),
    femurYaw: angle.nullable(),
    pelvisYaw: angle.nullable(),
    thighPart: angle.nullable(),
    pelvisPart: angle.nullable(),
    weight: z.number().nullable(),
    inFit: z.boolean(),
    missing: z.object({ lift: missing.nullable(), turn: missing.nullable() }),
    provisional: z.boolean(),
  })
  .meta({ id: 'CourseFrame', description: 'A marked frame; half widths are 95 %.' });

const boundaryNames = ['quietFrom', 'quietTo', 'footOff', 'top', 'lowerFrom', 'footDown'] as const;

const phases = z
  .object({
    boundaries: z.record(z.enum(boundaryNames), time.nullable()),
    moved: readonlyList(z.enum(boundaryNames)),
    footOffHalfGap: time.nullable(),
    byFrame: readonlyList(phase),
  })
  .meta({ id: 'RepPhases', description: 'Milliseconds; null where there is no evidence.' });

const substitution = z
  .object({
    measure: z.string(),
    unit: z.enum(['degrees', 'millimetres']),
    change: z.number().nullable(),
    smallestChange: z.number().nullable(),
    quiet: z.number().nullable(),
    missing: missing.nullable(),
  })
  .meta({ id: 'SubstitutionChange', description: 'From quiet stance to the top.' });

const repResult = z
  .object({
    id: z.string(),
    used: z.boolean(),
    why: readonlyList(repFault),
    set: readingSet,
    phases: phases.nullable(),
    frames: readonlyList(courseFrame),
    fMax: angle.nullable(),
    fit: fit.nullable(),
    curve: readonlyList(curvePoint),
    substitutions: readonlyList(substitution),
    liftFrom: z.string().optional(),
  })
  .meta({ id: 'RepResult' });

/** The engine's whole answer, as shared/reading describes it field by field. */
export const readingResult = z
  .object({
    engine: z.literal(ENGINES),
    rules: readingRules,
    inputHash: z.string(),
    supportSide: side,
    set: readingSet.nullable(),
    thighTurnsLittle: z.boolean(),
    code: z.enum(READING_CODES),
    line: z.literal([1, 2, 3, 4, 5, 6, 7]),
    before60: z.boolean(),
    provisional: z.boolean(),
    figures: figures.nullable(),
    onset: z.object({ mean: angle, low: angle, high: angle }).nullable(),
    returnPast90: z.object({ to: angle, change: angle }).nullable(),
    course: readonlyList(curvePoint),
    reps: readonlyList(repResult),
    reason,
    warnings: readonlyList(placedWarning),
    settle: readonlyList(settle),
  })
  .meta({
    id: 'ReadingResult',
    description: 'The engine’s result; angles in degrees, times in milliseconds.',
  });

/** The contract and the engine describe the same thing, or this file does not compile. */
type Same<A, B> = [A, B] extends [B, A] ? true : never;
true satisfies Same<z.infer<typeof readingResult>, ReadingResult>;

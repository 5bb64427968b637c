import * as z from 'zod';
import { EXCLUSION_REASONS } from '#shared/course/types.ts';
import type { Degrees } from '#shared/geometry/units.ts';
import { LANDMARK_IDS, LANDMARK_SETS } from '#shared/landmarks/types.ts';
import type { Milliseconds } from '#shared/timing/units.ts';
import { quantity, readonlyList, view } from './primitives.ts';

const angle = quantity<Degrees>('Degrees.');
const share = z.number().min(0).max(1);
const landmarks = readonlyList(z.enum(LANDMARK_IDS));
export const readingSet = z.enum(LANDMARK_SETS).meta({ id: 'LandmarkSet' });

/** A case of a union, told by its code. */
const coded = <const C extends string, S extends z.ZodRawShape>(code: C, shape: S) =>
  z.object({ code: z.literal(code), ...shape });

/** Why a value is not there. */
export const missing = z
  .discriminatedUnion('code', [
    coded('landmark-not-marked', { landmarks }),
    coded('landmark-hidden', { landmarks }),
    coded('no-quiet-stance', {}),
    coded('scale-missing', {}),
    coded('distance-missing', {}),
    coded('belt-pointer-length-missing', {}),
    coded('thigh-pointer-length-missing', {}),
    coded('body-height-missing', {}),
    coded('toe-direction-missing', {}),
    coded('view-cannot-show-it', { view }),
    coded('only-between-lifts', { from: angle, to: angle }),
    coded('not-in-side-clip', {}),
    coded('marks-coincide', {}),
  ])
  .meta({ id: 'Missing', description: 'Why a value is not there; it is never filled in.' });

const time = quantity<Milliseconds>('Milliseconds.');
const timestampFault = z
  .discriminatedUnion('code', [
    coded('time-not-a-number', { at: z.int() }),
    coded('time-repeated', { at: z.int(), time }),
    coded('time-runs-backward', { at: z.int(), from: time, to: time }),
  ])
  .meta({ id: 'TimestampFault', description: '`at` counts the rep’s marked frames from 0.' });

export const repFault = z
  .discriminatedUnion('code', [
    coded('excluded', { reason: z.enum(EXCLUSION_REASONS) }),
    coded('bad-timestamps', { fault: timestampFault }),
    coded('marks-implausible', { landmarks }),
    coded('no-frames', {}),
    coded('other-side', {}),
    coded('view-cannot-show-turn', { view }),
    coded('scale-missing', {}),
    coded('distance-missing', {}),
    coded('belt-pointer-length-missing', {}),
    coded('thigh-pointer-length-missing', {}),
    coded('landmarks-missing', { landmarks }),
    coded('no-foot-off', {}),
    z.object({
      code: z.enum(['few-quiet', 'few-near-60', 'few-near-90', 'few-across-window', 'few-in-rise']),
      have: z.int(),
      need: z.int(),
      from: angle.nullable(),
      to: angle.nullable(),
    }),
    coded('marks-coincide', {}),
    coded('poorer-set', { set: readingSet }),
  ])
  .meta({ id: 'RepFault', description: 'Why a rep does not count.' });

export const reason = z
  .discriminatedUnion('code', [
    coded('no-usable-rep', { reps: z.int() }),
    coded('lift-under-85', { reps: z.int(), of: z.int(), highest: angle }),
    coded('too-uncertain', { u: angle, limit: angle }),
    coded('early-probable', { p: share, limit: share }),
    coded('before-60-probable', { p: share, limit: share, pNotBack: share, limitNotBack: share }),
    coded('turn-in-probable', { p: share, limit: share }),
    coded('flat-probable', { p: share, limit: share }),
    coded('nothing-probable-enough', { pEarly: share, pIn: share, pFlat: share }),
  ])
  .meta({
    id: 'Reason',
    description: 'The line of the decision rule that held, with its figures.',
  });

const warning = z
  .discriminatedUnion('code', [
    coded('camera-off-front', { by: angle, limit: angle }),
    coded('plumb-off', { by: angle, limit: angle }),
    coded('too-near', { distanceMm: z.number(), limitMm: z.number() }),
    coded('too-coarse', { mmPerPx: z.number(), limit: z.number() }),
    coded('slow-frame-rate', { framesPerSecond: z.number(), limit: z.number() }),
    coded('mirrored', {}),
    coded('lens-height-missing', { liftHalfWidth: angle }),
    coded('smear', {
      px: z.number(),
      landmark: z.enum(LANDMARK_IDS).nullable(),
      limit: z.number(),
    }),
    coded('few-quiet-frames', { have: z.int(), recommended: z.int() }),
    coded('assumed-thigh', { sd: angle }),
    coded('gates-not-studied', { from: angle, to: angle }),
    coded('limit-lowered', { limit: share, studied: share }),
    coded('tracked-not-looked-at', { frames: z.int() }),
  ])
  .meta({ id: 'Warning', description: 'Shown beside the reading; none changes it.' });

export const placedWarning = z.object({ warning, reps: readonlyList(z.string()) });

export const settle = z
  .discriminatedUnion('code', [
    coded('mark-frames', { rep: z.string(), from: angle, to: angle, more: z.int() }),
    coded('mark-quiet-frames', { rep: z.string(), more: z.int() }),
    coded('give-scale', {}),
    coded('give-distance', {}),
    coded('give-pointer-length', { pointer: z.enum(['belt', 'thigh']) }),
    coded('mark-landmarks', { rep: z.string(), landmarks }),
    coded('film-from-front', {}),
    coded('lift-higher', { reached: angle, needed: angle }),
    coded('stand-still-first', {}),
    coded('another-rep', { u: angle, from: angle }),
    coded('richer-set', { set: readingSet, u: angle, from: angle }),
  ])
  .meta({ id: 'Settle', description: 'What would settle a reading that is not settled.' });

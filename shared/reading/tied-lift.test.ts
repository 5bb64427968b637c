import { describe, expect, it } from 'vitest';
import { courseOfRep, isCourse } from '#shared/course/course-of-rep.ts';
import { isTiedLift, liftFromSideRep } from '#shared/course/lift-from-side-rep.ts';
import type { RepInput } from '#shared/course/types.ts';
import { madeFront, type MadeMotion, madeSide } from '#shared/evaluate/made-pair.ts';
import { ASSUMED_MARK_ERROR } from '#shared/measures/inputs.ts';
import { STANDARD_RULES } from '#shared/protocol/protocol.ts';
import { canonicalText } from './canonical.ts';
import { deriveReading } from './derive.ts';
import { CURRENT_ENGINE, type EngineVersion } from './engine.ts';
import type { ReadingInput } from './types.ts';

const MOTION: MadeMotion = {
  side: 'right',
  stillMs: 1200,
  upMs: 1800,
  holdMs: 400,
  highest: 108,
  turnAt: (lift) => Math.max(0, lift - 60) / 3,
};
const side = madeSide(MOTION, { startMs: 2475, stepMs: 25, scatterPx: 1, seed: 4 });
const front = madeFront(MOTION, { startMs: 310, stepMs: 1000 / 30, scatterPx: 1, seed: 3 });
/** Nobody measured the lens height. */
const guessed: RepInput = { ...front, camera: { ...front.camera, lensHeightMm: null } };

/** Enough to tell one input from another. */
const RUNS = 400;

const timed = (rep: RepInput) => {
  const course = courseOfRep(rep, 'belt+thigh', ASSUMED_MARK_ERROR, { halfWidths: false });
  if (!isCourse(course)) throw new Error(course.code);
  return { course, clap: null };
};
const withSide = (rep: RepInput): RepInput => {
  const liftFrom = liftFromSideRep(timed(rep), timed(side));
  if (!isTiedLift(liftFrom)) throw new Error(liftFrom.code);
  return { ...rep, liftFrom };
};
const inputOf = (rep: RepInput, engine: EngineVersion, set: ReadingInput['set']): ReadingInput => ({
  engine,
  supportSide: 'right',
  set,
  thighTurnsLittle: false,
  markError: ASSUMED_MARK_ERROR,
  ownSystematic: null,
  rules: STANDARD_RULES,
  reps: [rep],
});

describe.each([
  [1, 'belt+thigh'],
  [CURRENT_ENGINE, 'belt'],
] as const)('engine %i with %s', (engine, set) => {
  it('reads the turn of the front clip against the lift of the side clip, and names it', () => {
    const own = deriveReading(inputOf(guessed, engine, set), RUNS);
    const tied = deriveReading(inputOf(withSide(guessed), engine, set), RUNS);
    expect(tied.reps[0]).toMatchObject({ used: true, why: [], liftFrom: 'side' });
    expect(own.reps[0]).not.toHaveProperty('liftFrom');
    // true: 10° more from 60° to 90°
    expect(Math.abs((tied.figures?.d ?? NaN) - 10)).toBeLessThan(2);
    expect(tied.figures?.uR).not.toBe(own.figures?.uR);
    expect(tied.inputHash).not.toBe(own.inputHash);
  });

  it('does not ask for the lens height that it no longer needs', () => {
    const codes = (rep: RepInput) =>
      deriveReading(inputOf(rep, engine, set), RUNS).warnings.map(({ warning }) => warning.code);
    expect(codes(guessed)).toContain('lens-height-missing');
    expect(codes(withSide(guessed))).not.toContain('lens-height-missing');
  });
});

it('leaves the input of a rep without a side clip as it was, to the letter', () => {
  const text = canonicalText(inputOf(front, CURRENT_ENGINE, null));
  expect(text).not.toContain('liftFrom');
  expect(canonicalText(inputOf({ ...front, liftFrom: undefined }, CURRENT_ENGINE, null))).toBe(
    text,
  );
});

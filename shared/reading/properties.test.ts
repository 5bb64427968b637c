import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { MADE_LIFTS, madeRep } from '#shared/evaluate/made-rep.ts';
import { framePoint } from '#shared/geometry/points.ts';
import type { Side } from '#shared/landmarks/types.ts';
import { LANDMARK_IDS } from '#shared/landmarks/types.ts';
import { ASSUMED_MARK_ERROR } from '#shared/measures/inputs.ts';
import { milliseconds } from '#shared/timing/units.ts';
import type { RepInput } from '#shared/course/types.ts';
import { STANDARD_RULES } from '#shared/protocol/protocol.ts';
import { deriveReading } from './derive.ts';
import { ENGINES, type EngineVersion } from './engine.ts';
import type { ReadingInput } from './types.ts';

const inputFor = (
  engine: EngineVersion,
  reps: readonly RepInput[],
  supportSide: Side,
): ReadingInput => ({
  engine,
  supportSide,
  set: null,
  thighTurnsLittle: false,
  markError: ASSUMED_MARK_ERROR,
  ownSystematic: null,
  rules: STANDARD_RULES,
  reps,
});

/** Every number in a result, however deep. */
const numbersIn = (value: unknown): readonly number[] => {
  if (typeof value === 'number') return [value];
  if (typeof value !== 'object' || value === null) return [];
  return Object.values(value).flatMap(numbersIn);
};

const mapPoints = (
  rep: RepInput,
  move: (u: number, v: number) => { readonly u: number; readonly v: number },
): RepInput => ({
  ...rep,
  frames: rep.frames.map((frame) => ({
    ...frame,
    marks: Object.fromEntries(
      Object.entries(frame.marks).map(([id, mark]) => [
        id,
        mark.hidden ? mark : { ...mark, point: move(mark.point.u, mark.point.v) },
      ]),
    ),
  })),
});

const slope = fc.double({ min: -0.5, max: 0.5, noNaN: true });
const turnOf = (k: number) => (lift: number) => k * Math.max(0, lift - 55);
/** The same cases in every run. */
const seed = 20260718;
const runs = { numRuns: 6, seed };
/** Whole readings take their time on a busy machine. */
const PATIENCE_MS = 120_000;

describe.each(ENGINES)('a reading of engine %i', (engine) => {
  const inputOf = (reps: readonly RepInput[], side: Side = 'left') => inputFor(engine, reps, side);

  it(
    'does not change when the body is mirrored and stands on the other leg',
    () => {
      fc.assert(
        fc.property(slope, fc.double({ min: 0, max: 1, noNaN: true }), (k, thighShare) => {
          const rep = madeRep('left', turnOf(k), { thighShare });
          const mirrored: RepInput = {
            ...mapPoints(rep, (u, v) => framePoint(rep.camera.width - u, v)),
            supportSide: 'right',
          };
          const left = deriveReading(inputOf([rep]));
          const right = deriveReading(inputOf([mirrored], 'right'));
          expect(right.code).toBe(left.code);
          expect(right.figures?.d).toBeCloseTo(left.figures?.d ?? NaN, 9);
          expect(right.figures?.pelvis.value).toBeCloseTo(left.figures?.pelvis.value ?? NaN, 9);
          for (const [i, frame] of (right.reps[0]?.frames ?? []).entries())
            expect(frame.lift).toBeCloseTo(left.reps[0]?.frames[i]?.lift ?? NaN, 9);
        }),
        runs,
      );
    },
    PATIENCE_MS,
  );

  it(
    'does not depend on how high the picture is cut, nor on when the clip starts',
    () => {
      fc.assert(
        fc.property(
          slope,
          fc.integer({ min: -300, max: 300 }),
          fc.integer({ min: 0, max: 9e6 }),
          (k, dv, dt) => {
            const rep = madeRep('left', turnOf(k));
            const moved = mapPoints(rep, (u, v) => framePoint(u, v + dv));
            const later: RepInput = {
              ...moved,
              frames: moved.frames.map((frame) => ({
                ...frame,
                time: milliseconds(frame.time + dt),
              })),
            };
            const a = deriveReading(inputOf([rep]));
            const b = deriveReading(inputOf([later]));
            expect(b.code).toBe(a.code);
            expect(b.figures?.d).toBeCloseTo(a.figures?.d ?? NaN, 9);
          },
        ),
        runs,
      );
    },
    PATIENCE_MS,
  );

  it(
    'does not depend on the resolution of the picture',
    () => {
      fc.assert(
        fc.property(slope, fc.double({ min: 0.5, max: 3, noNaN: true }), (k, by) => {
          const rep = madeRep('left', turnOf(k));
          const { camera } = rep;
          const scaled: RepInput = {
            ...mapPoints(rep, (u, v) => framePoint(u * by, v * by)),
            camera: {
              ...camera,
              width: camera.width * by,
              height: camera.height * by,
              mmPerPx: (camera.mmPerPx ?? NaN) / by,
            },
          };
          const a = deriveReading(inputOf([rep])).reps[0];
          const b = deriveReading(inputOf([scaled])).reps[0];
          for (const [i, frame] of (b?.frames ?? []).entries()) {
            expect(frame.lift).toBeCloseTo(a?.frames[i]?.lift ?? NaN, 6);
            expect(frame.turn).toBeCloseTo(a?.frames[i]?.turn ?? NaN, 6);
          }
        }),
        runs,
      );
    },
    PATIENCE_MS,
  );

  it(
    'never lets a number out that is not finite, whatever the marks are',
    () => {
      const wild = fc.oneof(
        fc.constantFrom(NaN, Infinity, -Infinity, 0, -0, 1e300, -1e300, 5e-324),
        fc.double({ min: -4000, max: 4000, noNaN: true }),
      );
      const spoiled = fc.record({
        frame: fc.nat(MADE_LIFTS.length - 1),
        landmark: fc.constantFrom(...LANDMARK_IDS),
        u: wild,
        v: wild,
        scale: fc.oneof(fc.constant(1), wild),
        hidden: fc.boolean(),
      });
      fc.assert(
        fc.property(slope, fc.array(spoiled, { minLength: 1, maxLength: 40 }), (k, all) => {
          const rep = madeRep('left', turnOf(k));
          const frames = rep.frames.map((frame, i) => {
            const marks = { ...frame.marks };
            for (const { landmark, u, v, scale, hidden } of all.filter((one) => one.frame === i))
              marks[landmark] = hidden
                ? { hidden }
                : { hidden, point: framePoint(u, v), scale, source: 'hand', looked: true };
            return { ...frame, marks };
          });
          const result = deriveReading(inputOf([{ ...rep, frames }]));
          const { reps, ...rest } = result;
          expect(numbersIn(rest).every(Number.isFinite)).toBe(true);
          for (const { why: _why, ...shown } of reps)
            expect(numbersIn(shown).every(Number.isFinite)).toBe(true);
        }),
        { numRuns: 30, seed },
      );
    },
    PATIENCE_MS,
  );

  it('knows no smallest change of a mark on a picture coarser than any', () => {
    const rep = madeRep('left', () => 0);
    const coarse = {
      hidden: false,
      point: framePoint(0, 0),
      source: 'hand',
      looked: true,
    } as const;
    const frames = rep.frames.map((frame, i) =>
      i === 0
        ? {
            ...frame,
            marks: {
              ...frame.marks,
              'heel-support': { ...coarse, scale: 1e300 },
              'asis-support': { ...coarse, scale: NaN },
            },
          }
        : frame,
    );
    const [result] = deriveReading(inputOf([{ ...rep, frames }])).reps;
    const heel = result?.substitutions.find(({ measure }) => measure === 'heel-rise');
    expect(heel?.smallestChange).toBeNull();
  });

  it(
    'never lets a number out that is not finite, whatever the camera is said to be',
    () => {
      const length = fc.oneof(
        fc.constantFrom(null, NaN, 0, -1, 1e-300, 1e300, Infinity),
        fc.double({ min: 0.1, max: 5000, noNaN: true }),
      );
      fc.assert(
        fc.property(length, length, length, length, length, (k, d, h, belt, thigh) => {
          const rep = madeRep('left', turnOf(0.3));
          const camera = {
            ...rep.camera,
            mmPerPx: k,
            distanceMm: d,
            lensHeightMm: h,
            beltPointerMm: belt,
            thighPointerMm: thigh,
          };
          const { reps, ...rest } = deriveReading(inputOf([{ ...rep, camera }]));
          expect(numbersIn(rest).every(Number.isFinite)).toBe(true);
          expect(numbersIn(reps).every(Number.isFinite)).toBe(true);
        }),
        { numRuns: 30, seed },
      );
    },
    PATIENCE_MS,
  );

  it(
    'takes any cut of a rep',
    () => {
      const rep = madeRep('left', turnOf(0.4));
      fc.assert(
        fc.property(fc.subarray([...rep.frames]), (frames) => {
          const result = deriveReading(inputOf([{ ...rep, frames }]));
          const [only] = result.reps;
          expect(only?.used).toBe(result.figures !== null);
          expect(only?.used === true || (only?.why.length ?? 0) > 0).toBe(true);
          expect(
            result.code === 'not-measurable' || result.code === 'lift-stops-short' || only?.used,
          ).toBe(true);
        }),
        { numRuns: 25, seed },
      );
    },
    PATIENCE_MS,
  );

  it.each([0, 1, 2])(
    'is not measurable from %d frames',
    (n) => {
      const rep = madeRep('left', turnOf(0.4));
      const result = deriveReading(inputOf([{ ...rep, frames: rep.frames.slice(0, n) }]));
      expect(result.code).toBe('not-measurable');
      expect(result.reps[0]?.why.length).toBeGreaterThan(0);
    },
    PATIENCE_MS,
  );

  it('is not measurable without a rep', () => {
    expect(deriveReading(inputOf([]))).toMatchObject({ code: 'not-measurable', reps: [] });
  });
});

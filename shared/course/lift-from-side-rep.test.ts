import { describe, expect, it } from 'vitest';
import { madeFront, madeLiftAt, type MadeMotion, madeSide } from '#shared/evaluate/made-pair.ts';
import { ASSUMED_MARK_ERROR } from '#shared/measures/inputs.ts';
import { milliseconds } from '#shared/timing/units.ts';
import { courseOfRep, isCourse, type RepCourse } from './course-of-rep.ts';
import { isTiedLift, liftFromSideRep } from './lift-from-side-rep.ts';
import type { RepInput } from './types.ts';

const MOTION: MadeMotion = {
  side: 'right',
  stillMs: 1200,
  upMs: 1800,
  holdMs: 400,
  highest: 108,
  turnAt: (lift) => Math.max(0, lift - 60) / 3,
};
const FRONT = { startMs: 310, stepMs: 1000 / 30, scatterPx: 1, seed: 3 };
const SIDE = { startMs: 2475, stepMs: 25, scatterPx: 1, seed: 4 };

const courseOf = (rep: RepInput): RepCourse => {
  const course = courseOfRep(rep, 'belt+thigh', ASSUMED_MARK_ERROR, { halfWidths: false });
  if (!isCourse(course)) throw new Error(course.code);
  return course;
};
const timed = (rep: RepInput, clap: number | null = null) => ({
  course: courseOf(rep),
  clap: clap === null ? null : milliseconds(clap),
});
const tiedOf = (front: RepInput, side: RepInput) => {
  const lift = liftFromSideRep(timed(front), timed(side));
  if (!isTiedLift(lift)) throw new Error(lift.code);
  return lift;
};
/** The lens 40 cm higher than it stood: lift from the front is wrong by up to 7°. */
const misjudged = (rep: RepInput): RepInput => ({
  ...rep,
  camera: { ...rep.camera, lensHeightMm: 1300 },
});
/** Largest error of the lifts of the rise, degrees. */
const worst = (rep: RepInput): number => {
  const rise = courseOf(rep).frames.filter(
    ({ phase, lift }) => phase === 'rise' && (lift ?? 0) > 25,
  );
  expect(rise.length).toBeGreaterThan(30);
  return Math.max(
    ...rise.map(({ time, lift }) =>
      Math.abs((lift ?? NaN) - madeLiftAt(MOTION, time - FRONT.startMs)),
    ),
  );
};

describe.each(['left', 'right'] as const)(
  'a front and a side clip of one lift, on the %s',
  (side) => {
    const motion = { ...MOTION, side };
    const front = madeFront(motion, FRONT);
    const liftFrom = tiedOf(front, madeSide(motion, SIDE));

    it('give the front rep the lift that the side clip shows', () => {
      expect(liftFrom.from).toBe('side');
      expect(worst({ ...front, liftFrom })).toBeLessThan(4);
      expect(worst(misjudged(front))).toBeGreaterThan(6);
      expect(
        worst({ ...misjudged(front), liftFrom: tiedOf(misjudged(front), madeSide(motion, SIDE)) }),
      ).toBeLessThan(4);
    });

    it('leave the turn to the front clip', () => {
      const own = courseOf(front);
      const tied = courseOf({ ...front, liftFrom });
      expect(tied.frames.map(({ turn }) => turn)).toEqual(own.frames.map(({ turn }) => turn));
    });

    it('say how sure the lift is, and are as sure as that', () => {
      const course = courseOfRep({ ...front, liftFrom }, 'belt+thigh', ASSUMED_MARK_ERROR);
      if (!isCourse(course)) throw new Error(course.code);
      const rise = course.frames.filter(({ phase }) => phase === 'rise');
      const inside = rise.filter(
        ({ time, lift, liftHalfWidth }) =>
          Math.abs((lift ?? NaN) - madeLiftAt(motion, time - FRONT.startMs)) <=
          (liftHalfWidth ?? 0),
      );
      expect(inside.length / rise.length).toBeGreaterThanOrEqual(0.95);
      expect(Math.max(...rise.map(({ liftHalfWidth }) => liftHalfWidth ?? NaN))).toBeLessThan(8);
    });

    it('keep apart what the clocks are off by, most where the lift is quickest', () => {
      const [first, ...more] = liftFrom.samples;
      expect(first?.byTie).toHaveLength(3);
      const off = [first, ...more].map((sample) => Math.hypot(...(sample?.byTie ?? [NaN])));
      const at = off.indexOf(Math.max(...off));
      const { lift = NaN } = liftFrom.samples[at] ?? {};
      expect(lift).toBeGreaterThan(20);
      expect(lift).toBeLessThan(100);
      expect(Math.min(...off)).toBeLessThan(0.3);
    });

    it('are surer of the lift for someone whose marks repeat well, not of the clocks', () => {
      const half = (anatomicalPx: number) => {
        const error = { anatomicalPx, doublyMarkedFrames: 20 };
        const course = courseOfRep({ ...front, liftFrom }, 'belt+thigh', error);
        if (!isCourse(course)) throw new Error(course.code);
        return course.setting.tiedLift?.samples[40];
      };
      const [usual, own] = [half(3), half(1)];
      expect(usual).toEqual(liftFrom.samples[40]);
      expect(own?.u).toBeCloseTo((usual?.u ?? NaN) / 3, 12);
      expect(own?.byTie).toEqual(usual?.byTie);
    });
  },
);

describe('clips that do not show one lift', () => {
  const front = madeFront(MOTION, FRONT);

  it('are refused where the way up takes another time', () => {
    const slower = madeSide({ ...MOTION, upMs: 2200 }, SIDE);
    const fault = liftFromSideRep(timed(front), timed(slower));
    expect(fault).toMatchObject({ code: 'durations-differ', events: ['foot-off', 'top'] });
  });

  it('are refused where the top is held for another time', () => {
    const longer = madeSide({ ...MOTION, holdMs: 900 }, SIDE);
    const fault = liftFromSideRep(timed(front), timed(longer));
    expect(fault).toMatchObject({ code: 'durations-differ', events: ['top', 'foot-down'] });
  });

  it('are refused where a clap lies elsewhere', () => {
    const side = madeSide(MOTION, SIDE);
    const apart = (late: number) =>
      liftFromSideRep(timed(front, FRONT.startMs + 200), timed(side, SIDE.startMs + 200 + late));
    expect(isTiedLift(apart(0))).toBe(true);
    expect(apart(400)).toMatchObject({ code: 'durations-differ', events: ['clap', 'foot-off'] });
    expect(apart(1700)).toMatchObject({ code: 'events-out-of-order' });
  });

  it('are refused where they share too little', () => {
    const still = madeSide({ ...MOTION, highest: 0 }, SIDE);
    expect(liftFromSideRep(timed(front), timed(still))).toEqual({
      code: 'few-shared-events',
      have: [],
    });
  });
});

it('knows no lift where the side clip is not marked', () => {
  const front = madeFront(MOTION, FRONT);
  const side = madeSide(MOTION, SIDE);
  const gap = side.frames.filter(({ time }) => time < 4300 || time > 4600);
  const liftFrom = tiedOf(front, { ...side, frames: gap });
  const { frames } = courseOf({ ...front, liftFrom });
  const blind = frames.filter(({ lift }) => lift === null);
  expect(blind.length).toBeGreaterThan(6);
  for (const { missing, inFit } of blind) {
    expect(missing.lift).toEqual({ code: 'not-in-side-clip' });
    expect(inFit).toBe(false);
  }
  expect(courseOf(front).frames.filter(({ lift }) => lift === null)).toEqual([]);
});

import { describe, expect, it } from 'vitest';
import { madeRep } from '#shared/evaluate/made-rep.ts';
import { degrees } from '#shared/geometry/units.ts';
import { ASSUMED_MARK_ERROR, type CameraInput } from '#shared/measures/inputs.ts';
import type { LandmarkId } from '#shared/landmarks/types.ts';
import { milliseconds } from '#shared/timing/units.ts';
import { STANDARD_GATES } from '#shared/protocol/protocol.ts';
import { brokenLine } from './broken-line.ts';
import { courseOfRep, isCourse, type RepCourse } from './course-of-rep.ts';
import { bandwidthOf, localLinear } from './local-linear.ts';
import { riseDataOf } from './rise-data.ts';
import { fitRise } from './rise-fit.ts';
import { findRise } from './rise.ts';
import { medianOfThree } from './robust.ts';
import type { RepInput } from './types.ts';

/** What comes of inputs that cannot carry an answer: null or the input itself, never a number made up. */

const rep = madeRep('left', () => 0);
const courseOf = (input: RepInput, set: RepCourse['set'] = 'belt+thigh'): RepCourse => {
  const course = courseOfRep(input, set, ASSUMED_MARK_ERROR, { halfWidths: false });
  if (!isCourse(course)) throw new Error(course.code);
  return course;
};
const withCamera = (over: Partial<CameraInput>): RepInput => ({
  ...rep,
  camera: { ...rep.camera, ...over },
});
const without = (id: LandmarkId): RepInput => ({
  ...rep,
  frames: rep.frames.map((frame) => {
    const { [id]: _gone, ...marks } = frame.marks;
    return { ...frame, marks };
  }),
});

describe('a broken line', () => {
  it('is not fitted to lists of different lengths nor to what is no number', () => {
    expect(brokenLine([1, 2, 3, 4, 5], [1, 2, 3, 4])).toBeNull();
    expect(brokenLine([1, 2, 3, 4, Infinity], [1, 2, 3, 4, 5])).toBeNull();
    expect(brokenLine([1, 2, 3, 4, 5], [1, NaN, 3, 4, 5])?.squares ?? NaN).toBeNaN();
  });
});

describe('local straight lines', () => {
  it('leave fewer than four values as they are', () => {
    expect(localLinear([0, 100, 200], [1, 5, 2])).toEqual([1, 5, 2]);
    expect(bandwidthOf([])).toBe(150);
    expect(bandwidthOf([0, 100, 200])).toBe(250);
  });

  it('leave values of one moment as they are', () => {
    expect(localLinear([5, 5, 5, 5], [1, 2, 3, 4])).toEqual([1, 2, 3, 4]);
  });
});

const numbersOf = (course: RepCourse) => riseDataOf(course, STANDARD_GATES);

describe('the numbers of a rise', () => {
  it('are there for every set that has its lengths', () => {
    for (const set of ['bare', 'belt', 'belt+thigh'] as const)
      expect(numbersOf(courseOf(rep, set))?.count).toBeGreaterThan(15);
  });

  it('are not there without a length, a pointer or a quiet stance', () => {
    expect(numbersOf(courseOf(withCamera({ beltPointerMm: null }), 'belt'))).toBeNull();
    expect(numbersOf(courseOf(withCamera({ thighPointerMm: null })))).toBeNull();
    expect(numbersOf(courseOf(without('lifted-knee')))).toBeNull();
    expect(numbersOf(courseOf(without('asis-support')))).toBeNull();
    expect(numbersOf(courseOf(without('knee-inner'), 'belt'))).toBeNull();
  });

  it('carry no fit where one of them is none', () => {
    const data = numbersOf(courseOf(rep));
    if (!data) throw new Error('no data');
    const broken = Float64Array.from(data.thighPart, (value, i) => (i === 3 ? NaN : value));
    expect(fitRise(data.lifts, data.weights, broken, data.pelvisPart, STANDARD_GATES)).toBeNull();
    const nowhere = data.lifts.map(() => NaN);
    expect(
      fitRise(nowhere, data.weights, data.thighPart, data.pelvisPart, STANDARD_GATES),
    ).toBeNull();
  });
});

describe('a rise', () => {
  const stance = {
    quiet: [],
    footOff: milliseconds(100),
    footOffHalfGap: null,
    heights: [0, 50, null, 60, 0],
    footOffMm: 25,
  };
  const times = [0, 100, 200, 300, 400].map(milliseconds);
  const lifts = [0, 40, 80, 84, 30].map(degrees);

  it('ends at the top and comes down where the foot passes its height, between two marks', () => {
    const found = findRise(times, lifts, stance, {});
    expect(found.top).toBe(200);
    expect(found.lowerFrom).toBe(300);
    // 60 mm at 300 ms, 0 mm at 400 ms: 25 mm at 300 + 35/60 · 100
    expect(found.footDown).toBeCloseTo(300 + (35 / 60) * 100, 9);
  });

  it('has no top and no foot down where no lift is known', () => {
    const unknown = findRise(
      times,
      lifts.map(() => null),
      stance,
      {},
    );
    expect(unknown).toMatchObject({ top: null, lowerFrom: null, footDown: null });
    expect(unknown.byFrame.every((phase) => phase === 'between')).toBe(true);
  });

  it('has no foot down where the ankle’s height is unknown or never comes back', () => {
    expect(findRise(times, lifts, { ...stance, footOffMm: null }, {}).footDown).toBeNull();
    const up = { ...stance, heights: [0, 50, 60, 60, 60] };
    const { footDown, byFrame } = findRise(times, lifts, up, {});
    expect(footDown).toBeNull();
    expect(byFrame[4]).toBe('lower');
  });

  it('takes a top moved by hand as it is, and the frame at or before it', () => {
    const moved = findRise(times, lifts, stance, { top: milliseconds(150) });
    expect(moved.top).toBe(150);
    const early = findRise(times, lifts, stance, { top: milliseconds(-1) });
    expect(early.lowerFrom).toBe(300);
  });

  it('keeps frames of unknown lift inside it', () => {
    const gap = [degrees(0), degrees(40), null, degrees(84), degrees(30)];
    expect(findRise(times, gap, stance, {}).byFrame[2]).toBe('rise');
  });
});

it('a middle of three needs three: with a gap beside it the lower of two is taken', () => {
  expect(medianOfThree([null, 5, 3])).toEqual([null, 3, 3]);
  expect(medianOfThree([null, null])).toEqual([null, null]);
});

describe('phases known from elsewhere', () => {
  it('leave frames without one between, and a rep without a rise has no top', () => {
    const quiet = rep.frames.slice(0, 8).map(() => 'quiet' as const);
    const { phases } = courseOf({ ...rep, labels: quiet });
    expect(phases.byFrame.slice(7, 10)).toEqual(['quiet', 'between', 'between']);
    expect(phases.boundaries).toMatchObject({ quietFrom: 0, top: null, lowerFrom: null });
  });

  it('have no top where no lift of the rise is known', () => {
    const labels = rep.frames.map((_, i) => (i < 12 ? ('quiet' as const) : ('rise' as const)));
    const { phases, frames } = courseOf({ ...without('lifted-knee'), labels });
    expect(frames.every(({ lift }) => lift === null)).toBe(true);
    expect(phases.byFrame.filter((phase) => phase === 'rise')).toHaveLength(labels.length - 12);
    expect(phases.boundaries.quietTo).toBe(rep.frames[11]?.time);
  });
});

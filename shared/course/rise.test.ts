import { describe, expect, it } from 'vitest';
import { madeRep } from '#shared/evaluate/made-rep.ts';
import { degrees } from '#shared/geometry/units.ts';
import { LANDMARK_SETS } from '#shared/landmarks/types.ts';
import { ASSUMED_MARK_ERROR } from '#shared/measures/inputs.ts';
import { STANDARD_GATES } from '#shared/protocol/protocol.ts';
import { courseOfRep, isCourse, type RepCourse } from './course-of-rep.ts';
import { COORDINATES, type RiseData, riseDataOf } from './rise-data.ts';
import { drawnSpread, drawRise } from './rise-draws.ts';
import { changeTerms, dot, fitRise, preTerms, terms } from './rise-fit.ts';
import { substitutionsOf } from './substitutions.ts';
import type { RepInput } from './types.ts';

const CHANGE = changeTerms(STANDARD_GATES);
const PRE = preTerms(STANDARD_GATES);

const courseOf = (rep: RepInput, set: RepCourse['set'] = 'belt+thigh'): RepCourse => {
  const course = courseOfRep(rep, set, ASSUMED_MARK_ERROR, { halfWidths: false });
  if (!isCourse(course)) throw new Error(course.code);
  return course;
};

/** Nothing to 60°, then outward by 0.4° for each degree of lift. */
const early = (lift: number): number => 0.4 * Math.max(0, lift - 60);

const dataOf = (rep: RepInput, set?: RepCourse['set']) => {
  const data = riseDataOf(courseOf(rep, set), STANDARD_GATES);
  if (!data) throw new Error('no data');
  return data;
};

describe.each(LANDMARK_SETS)('the fit with %s', (set) => {
  it.each(['left', 'right'] as const)('finds a turn of 12° standing on the %s', (side) => {
    const data = dataOf(madeRep(side, early, { thighShare: 0.3 }), set);
    const fit = fitRise(data.lifts, data.weights, data.thighPart, data.pelvisPart, STANDARD_GATES);
    if (!fit) throw new Error('no fit');
    expect(Math.abs(dot(CHANGE, fit.turn) - 12)).toBeLessThan(1.5);
    expect(Math.abs(dot(CHANGE, fit.thigh) - 3.6)).toBeLessThan(0.8);
    expect(Math.abs(dot(PRE, fit.turn))).toBeLessThan(1);
    expect(dot(CHANGE, fit.thigh) + dot(CHANGE, fit.pelvis)).toBeCloseTo(dot(CHANGE, fit.turn), 9);
    expect(
      dot(terms(degrees(90), STANDARD_GATES), fit.turn) -
        dot(terms(degrees(60), STANDARD_GATES), fit.turn),
    ).toBeCloseTo(dot(CHANGE, fit.turn), 9);
  });
});

describe('lifts tied to another clip', () => {
  const made = dataOf(madeRep('left', early));
  const none = (count: number) => new Float64Array(count);
  /** Every frame so often, the lifts known but for an error that each has for itself and one that all share. */
  const tied = (times: number, alone: number, shared: number | null): RiseData => {
    const count = times * made.count;
    const repeat = (column: Float64Array) =>
      Float64Array.from({ length: count }, (_, i) => column[i % made.count] ?? NaN);
    return {
      ...made,
      count,
      lifts: repeat(made.lifts),
      weights: repeat(made.weights),
      thighPart: repeat(made.thighPart),
      pelvisPart: repeat(made.pelvisPart),
      coordinates: made.coordinates.map(({ at }, k) =>
        k === COORDINATES.kneeV
          ? { at: repeat(made.lifts), error: none(count).fill(alone) }
          : { at: repeat(at), error: none(count) },
      ),
      liftIsTied: true,
      tie: shared === null ? [] : [none(count).fill(shared)],
    };
  };
  const spread = (data: RiseData) => drawnSpread(drawRise(data, 7), [...CHANGE, ...CHANGE]);

  it('are off together: the fit of the lifts moved as one is the truth, however many frames there are', () => {
    const moved = (by: number) => {
      const lifts = made.lifts.map((lift) => lift + by);
      const fit = fitRise(lifts, made.weights, made.thighPart, made.pelvisPart, STANDARD_GATES);
      return dot(CHANGE, fit?.turn ?? [NaN, NaN, NaN, NaN]);
    };
    const truth = Math.abs(moved(2) - moved(-2)) / 2;
    expect(truth).toBeGreaterThan(0.2);
    for (const times of [1, 4])
      expect(Math.abs(spread(tied(times, 0, 2)) / truth - 1)).toBeLessThan(0.1);
  });

  it('are averaged where each is off for itself', () => {
    expect(spread(tied(4, 2, null)) / spread(tied(1, 2, null))).toBeCloseTo(0.5, 1);
  });

  it('take no draw of their own where nothing is tied', () => {
    const untied = { ...made, tie: [] };
    expect([...drawRise(untied, 5, 50).covariance]).toEqual([...drawRise(made, 5, 50).covariance]);
    expect(made.tie).toEqual([]);
  });
});

describe('the draws', () => {
  const data = dataOf(madeRep('left', early));

  it('are the same for one seed', () => {
    const a = drawRise(data, 5, 300);
    const b = drawRise(data, 5, 300);
    expect([...a.covariance]).toEqual([...b.covariance]);
    expect(a.count).toBe(300);
  });

  it('give nearly the same spread for another seed', () => {
    const weights = [...CHANGE, ...CHANGE];
    const a = drawnSpread(drawRise(data, 1), weights);
    const b = drawnSpread(drawRise(data, 2), weights);
    expect(a).toBeGreaterThan(0);
    expect(Math.abs(a / b - 1)).toBeLessThan(0.03);
  });

  it('have no spread of fewer than two runs', () => {
    expect(drawnSpread(drawRise(data, 1, 1), [...CHANGE, ...CHANGE])).toBeNaN();
  });

  it('have twice the spread with twice the error', () => {
    const doubled = courseOfRep(
      madeRep('left', early),
      'belt',
      { anatomicalPx: 6, doublyMarkedFrames: 20 },
      { halfWidths: false },
    );
    const wide = isCourse(doubled) ? riseDataOf(doubled, STANDARD_GATES) : null;
    if (!wide) throw new Error('no data');
    const pelvis = [0, 0, 0, 0, ...CHANGE];
    const thigh = [...CHANGE, 0, 0, 0, 0];
    const narrow = dataOf(madeRep('left', early), 'belt');
    const ratio = (part: readonly number[]): number =>
      drawnSpread(drawRise(wide, 1), part) / drawnSpread(drawRise(narrow, 1), part);
    expect(Math.abs(ratio(thigh) - 2)).toBeLessThan(0.2);
    // the belt's tip keeps its own error, so the pelvis part grows by less
    expect(ratio(pelvis)).toBeGreaterThan(1.1);
    expect(ratio(pelvis)).toBeLessThan(2);
  });
});

describe('substitutions from quiet stance to the top', () => {
  const changes = substitutionsOf(
    courseOf(
      madeRep('left', () => 0),
      'bare',
    ),
  );
  const of = (measure: string) => changes.find((change) => change.measure === measure);

  it('list what a front clip can show', () => {
    expect(changes.map(({ measure }) => measure)).toEqual([
      'trunk-side-bend',
      'pelvic-obliquity',
      'support-hip-adduction',
      'frontal-plane-projection',
      'foot-turn-out',
      'heel-rise',
      'lifted-shank-swing',
      'lifted-knee-drift',
    ]);
  });

  it('are nought in a rep without any', () => {
    for (const id of ['trunk-side-bend', 'pelvic-obliquity', 'heel-rise', 'foot-turn-out'])
      expect(of(id)?.change).toBeCloseTo(0, 6);
    expect(of('trunk-side-bend')?.smallestChange).toBeGreaterThanOrEqual(2.5);
  });

  it('keep the quiet stance’s own value, not zeroed', () => {
    expect(of('foot-turn-out')?.quiet).toBeGreaterThan(5);
  });

  it('say what is missing', () => {
    const rep = madeRep('left', () => 0);
    const without: RepInput = {
      ...rep,
      frames: rep.frames.map((frame) => {
        const { 'acromion-lifted': _gone, ...marks } = frame.marks;
        return { ...frame, marks };
      }),
    };
    const bend = substitutionsOf(courseOf(without, 'bare'))[0];
    expect(bend?.change).toBeNull();
    expect(bend?.missing).toEqual({
      code: 'landmark-not-marked',
      landmarks: ['acromion-lifted'],
    });
  });
});

import fc from 'fast-check';
import { readdirSync, readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { trialOf } from '#shared/evaluate/trial.ts';
import { degrees } from '#shared/geometry/units.ts';
import { ASSUMED_MARK_ERROR } from '#shared/measures/inputs.ts';
import { frameIndex, milliseconds } from '#shared/timing/units.ts';
import { courseOfRep, isCourse } from './course-of-rep.ts';
import { type LiftFrame, liftWay, type LiftWay, matchLifts } from './match-lifts.ts';
import type { CourseFrame, FramePhase } from './types.ts';

const RUNS = { seed: 20261202, numRuns: 300 };

const courseFrame = (frame: number, lift: number | null, phase: FramePhase): CourseFrame => ({
  frame: frameIndex(frame),
  time: milliseconds(frame * 10),
  phase,
  lift: lift === null ? null : degrees(lift),
  liftHalfWidth: null,
  turn: null,
  turnHalfWidth: null,
  femurYaw: null,
  pelvisYaw: null,
  thighPart: null,
  pelvisPart: null,
  weight: null,
  inFit: true,
  missing: { lift: null, turn: null },
  provisional: false,
});

/** A rep that rises to a top and falls, wavering, with frames marked at uneven distances and some lifts unknown. */
const aRep = fc
  .record({
    top: fc.double({ min: 60, max: 120, noNaN: true }),
    up: fc.array(
      fc.tuple(fc.integer({ min: 1, max: 9 }), fc.double({ min: -6, max: 6, noNaN: true })),
      {
        minLength: 3,
        maxLength: 40,
      },
    ),
    down: fc.array(
      fc.tuple(fc.integer({ min: 1, max: 9 }), fc.double({ min: -6, max: 6, noNaN: true })),
      {
        maxLength: 30,
      },
    ),
    unknown: fc.array(fc.nat(60), { maxLength: 4 }),
    start: fc.nat(500),
  })
  .map(({ top, up, down, unknown, start }) => {
    let frame = start;
    const rise = up.map(([step, waver], n) => {
      frame += step;
      return courseFrame(frame, 5 + ((top - 5) * (n + 1)) / up.length + waver, 'rise');
    });
    const fall = down.map(([step, waver], n) => {
      frame += step;
      return courseFrame(frame, top * (1 - (n + 1) / (down.length + 1)) + waver, 'lower');
    });
    return [...rise, ...fall].map((each, n) =>
      unknown.includes(n) ? { ...each, lift: null } : each,
    );
  });

/** The largest change of lift from one frame to the next. */
const largestStep = (frames: readonly CourseFrame[]): number => {
  const known = frames.filter(({ lift }) => lift !== null);
  return known.reduce((most, { frame, lift }, n) => {
    const next = known[n + 1];
    if (!next || lift === null || next.lift === null) return most;
    return Math.max(most, Math.abs(next.lift - lift) / (next.frame - frame));
  }, 0);
};

const gap = (way: readonly LiftFrame[]) =>
  way.slice(1).reduce((most, { lift }, n) => Math.max(most, lift - (way[n]?.lift ?? lift)), 0);

const expectMatched = (one: readonly CourseFrame[], other: readonly CourseFrame[]) => {
  const moments = matchLifts(liftWay(one), liftWay(other));
  const step = Math.max(largestStep(one), largestStep(other));
  for (const { first, second } of moments) {
    expect(Math.abs(first.lift - second.lift)).toBeLessThanOrEqual(step + 1e-9);
    expect(Math.min(first.lift, second.lift)).toBeGreaterThanOrEqual(20 - step);
  }
  for (const [n, now] of moments.entries()) {
    const next = moments[n + 1];
    if (!next) continue;
    // time only goes forward in both, and lift upwards in the rise and downwards in the fall
    expect(next.first.frame).toBeGreaterThanOrEqual(now.first.frame);
    expect(next.second.frame).toBeGreaterThanOrEqual(now.second.frame);
    if (now.part === 'fall') expect(next.part).toBe('fall');
    if (now.part !== next.part) continue;
    const way = now.part === 'rise' ? 1 : -1;
    expect(way * (next.first.lift - now.first.lift)).toBeGreaterThanOrEqual(0);
    expect(way * (next.second.lift - now.second.lift)).toBeGreaterThanOrEqual(0);
  }
  return moments;
};

describe('the way of one rep', () => {
  it('goes up by records and down by records, never by more than one frame’s step', () => {
    fc.assert(
      fc.property(aRep, (frames) => {
        const { rise, fall } = liftWay(frames);
        const step = largestStep(frames) + 1e-9;
        expect(gap(rise)).toBeLessThanOrEqual(step);
        expect(gap(fall)).toBeLessThanOrEqual(step);
      }),
      RUNS,
    );
  });

  it('fills the frames between marks on a straight line and leaves out what falls behind', () => {
    const way = liftWay([
      courseFrame(0, 10, 'quiet'),
      courseFrame(10, 20, 'rise'),
      courseFrame(12, 30, 'rise'),
      courseFrame(13, 28, 'rise'),
      courseFrame(14, null, 'rise'),
      courseFrame(15, 40, 'rise'),
      courseFrame(17, 20, 'lower'),
    ]);
    expect(way.rise).toEqual([
      { frame: 10, lift: 20 },
      { frame: 11, lift: 25 },
      { frame: 12, lift: 30 },
      { frame: 14, lift: 34 },
      { frame: 15, lift: 40 },
    ]);
    expect(way.fall).toEqual([
      { frame: 17, lift: 20 },
      { frame: 16, lift: 30 },
      { frame: 15, lift: 40 },
    ]);
  });
});

describe('two reps matched by lift', () => {
  it('never differ by more than one frame’s step, and only go forward', () => {
    fc.assert(
      fc.property(aRep, aRep, (one, other) => {
        expectMatched(one, other);
      }),
      RUNS,
    );
  });

  it('show a rep beside itself frame by frame, without any difference', () => {
    fc.assert(
      fc.property(aRep, (frames) => {
        for (const { first, second } of matchLifts(liftWay(frames), liftWay(frames)))
          expect(second).toEqual(first);
      }),
      RUNS,
    );
  });

  it('show lifts that both reach, and none where they share none', () => {
    const low: LiftWay = { rise: [{ frame: frameIndex(0), lift: degrees(30) }], fall: [] };
    const high: LiftWay = { rise: [{ frame: frameIndex(0), lift: degrees(90) }], fall: [] };
    expect(matchLifts(low, high)).toEqual([]);
    expect(matchLifts(liftWay([]), liftWay([]))).toEqual([]);
    expect(matchLifts(low, low)).toHaveLength(1);
  });

  it('hold on all pairs of reps of the golden trials', () => {
    const courses = readdirSync('tests/fixtures/golden')
      .filter((name) => /^g\d+.*\.json$/.test(name))
      .flatMap((name) => {
        const trial = trialOf(JSON.parse(readFileSync(`tests/fixtures/golden/${name}`, 'utf8')));
        return trial.reps.flatMap((rep) => {
          const course = courseOfRep(rep, 'belt+thigh', ASSUMED_MARK_ERROR, { halfWidths: false });
          return isCourse(course) ? [course.frames] : [];
        });
      });
    expect(courses.length).toBeGreaterThan(15);
    let moments = 0;
    for (const one of courses)
      for (const other of courses) moments += expectMatched(one, other).length;
    expect(moments).toBeGreaterThan(courses.length ** 2);
  });
});

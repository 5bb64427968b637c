import { describe, expect, it } from 'vitest';
import type { Mark } from '#shared/contracts/reps.ts';
import type { CourseFrame } from '#shared/course/types.ts';
import { framePoint } from '#shared/geometry/points.ts';
import { degrees } from '#shared/geometry/units.ts';
import type { MarkValue } from '#shared/landmarks/commands.ts';
import { frameIndex, type FrameIndex, milliseconds } from '#shared/timing/units.ts';
import { engineMarks, timesOf } from '#shared/records/engine-input.ts';
import { expectedPlace } from './expected-place.ts';
import { firstFrame } from './first-frames.ts';
import { frameAtLift, hillOf, liftAt } from './hill.ts';
import { isDone, ledLandmarks, nextLandmark, proposedSet, tallyOf } from './led.ts';
import { markedFrames, marksWith } from '#shared/records/stored-marks.ts';
import { STANDARD_RULES } from '#shared/protocol/protocol.ts';

const at = (u: number, v: number, over: Partial<MarkValue> = {}): MarkValue => ({
  to: 'point',
  point: framePoint(u, v),
  source: 'hand',
  looked: true,
  confidence: null,
  pictureLongEdge: 1920,
  ...over,
});
const stored = (frame: number, landmark: string, u: number): Mark => ({
  frame,
  landmark,
  u,
  v: 5,
  hidden: false,
  source: 'hand',
  looked: true,
  confidence: null,
  pictureLongEdge: 1920,
  revision: 1,
  by: { id: '0', name: 'Maren Okafor' },
  at: '2026-03-03T16:25:00Z',
});
const F = (n: number) => frameIndex(n);

describe('marks on show', () => {
  it('are the stored ones with what waits laid over them', () => {
    const marks = marksWith(
      [stored(3, 'kneecap', 1), stored(9, 'belt-tip', 2), stored(9, 'third-eye', 7)],
      [
        { frame: F(3), landmark: 'kneecap', after: at(8, 8) },
        { frame: F(9), landmark: 'belt-tip', after: null },
        { frame: F(5), landmark: 'kneecap', after: { to: 'hidden' } },
      ],
    );
    expect(markedFrames(marks)).toEqual([3, 5]);
    expect(marks.get(F(3))?.kneecap).toEqual(at(8, 8));
  });
});

describe('for the engine', () => {
  it('times come from the exact ticks', () => {
    expect(
      timesOf({ count: 3, timeBase: { num: 1, den: 90_000 }, ticks: [0, 1500, 3003] }),
    ).toEqual([0, 1500 / 90, 3003 / 90]);
  });

  it('a mark from a coarser picture says so', () => {
    const marks = engineMarks(
      {
        kneecap: at(1, 2, { pictureLongEdge: 960 }),
        'belt-tip': at(3, 4, { pictureLongEdge: 3840 }),
        'lifted-knee': { to: 'hidden' },
      },
      1920,
    );
    expect(marks.kneecap).toMatchObject({ scale: 2 });
    expect(marks['belt-tip']).toMatchObject({ scale: 1 });
    expect(marks['lifted-knee']).toEqual({ hidden: true });
  });
});

describe('expected place', () => {
  const marks = marksWith([stored(10, 'kneecap', 1), stored(16, 'kneecap', 2)], []);
  it('is that of the nearest frame, the earlier of two', () => {
    expect(expectedPlace(marks, F(12), 'kneecap')?.u).toBe(1);
    expect(expectedPlace(marks, F(13), 'kneecap')?.u).toBe(1);
    expect(expectedPlace(marks, F(14), 'kneecap')?.u).toBe(2);
  });
  it('is nowhere for what was never placed', () => {
    expect(expectedPlace(marks, F(12), 'belt-tip')).toBeNull();
  });
});

describe('led marking', () => {
  it('proposes the richest set whose lengths are known', () => {
    expect(proposedSet({ beltPointerMm: null, thighPointerMm: 120 })).toBe('bare');
    expect(proposedSet({ beltPointerMm: 130, thighPointerMm: null })).toBe('belt');
    expect(proposedSet({ beltPointerMm: 130, thighPointerMm: 120 })).toBe('belt+thigh');
  });

  it('leads through 10, 9 and 9 landmarks, and the extras where wished', () => {
    expect(ledLandmarks('front', 'bare', [])).toHaveLength(10);
    expect(ledLandmarks('front', 'belt', [])).toHaveLength(9);
    expect(ledLandmarks('front', 'belt+thigh', [])).toHaveLength(9);
    expect(ledLandmarks('front', 'belt+thigh', ['shoulders', 'foot'])).toHaveLength(13);
    expect(ledLandmarks('lifted-side', 'bare', [])).toEqual([
      'ankle-support',
      'ankle-lifted',
      'trochanter',
      'knee-lateral',
      'acromion',
    ]);
  });

  it('goes on by itself, begins again for what was passed over, and ends', () => {
    const led = ['asis-support', 'asis-lifted', 'belt-tip'] as const;
    expect(nextLandmark(led, {}, null)).toBe('asis-support');
    expect(nextLandmark(led, { 'asis-lifted': at(1, 1) }, 'asis-lifted')).toBe('belt-tip');
    expect(nextLandmark(led, { 'belt-tip': at(1, 1) }, 'belt-tip')).toBe('asis-support');
    const done = {
      'asis-support': at(1, 1),
      'asis-lifted': { to: 'hidden' as const },
      'belt-tip': at(1, 1),
    };
    expect(nextLandmark(led, done, 'belt-tip')).toBeNull();
  });

  it('asks for a tracked mark until somebody has looked', () => {
    const tracked = { kneecap: at(1, 1, { source: 'tracked', looked: false }) };
    expect(isDone(tracked, 'kneecap')).toBe(false);
    expect(tallyOf(['kneecap', 'belt-tip'], tracked)).toEqual({
      placed: 0,
      hidden: 0,
      tracked: 1,
      toGo: 1,
    });
  });
});

const TIMES = Array.from({ length: 201 }, (_, n) => milliseconds(n * 20));
const courseFrame = (frame: number, lift: number | null, phase: CourseFrame['phase']) =>
  ({
    frame: F(frame),
    time: milliseconds(frame * 20),
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
    inFit: false,
    missing: { lift: null, turn: null },
    provisional: false,
  }) satisfies CourseFrame;

describe('the hill', () => {
  const hill = hillOf([
    courseFrame(50, 10, 'rise'),
    courseFrame(100, 60, 'rise'),
    courseFrame(130, 90, 'rise'),
    courseFrame(180, 20, 'lower'),
  ]);
  it('is straight between marked frames and unknown outside', () => {
    expect(liftAt(hill, milliseconds(1500))).toBe(35);
    expect(liftAt(hill, milliseconds(900))).toBeNull();
  });
  it('gives the frame of the rise for a lift, never of the lowering', () => {
    expect(frameAtLift(hill, degrees(75), TIMES)).toBe(115);
    expect(frameAtLift(hill, degrees(5), TIMES)).toBe(50);
    expect(frameAtLift(hill, degrees(110), TIMES)).toBe(130);
    expect(frameAtLift([], degrees(75), TIMES)).toBeNull();
  });
});

describe('what to mark first', () => {
  const span: readonly [FrameIndex, FrameIndex] = [F(0), F(200)];
  const suggest = (frames: CourseFrame[]) =>
    firstFrame(span, TIMES, frames, hillOf(frames), STANDARD_RULES);

  it('five quiet frames over the first second', () => {
    expect(suggest([])).toEqual({ frame: 0, why: 'quiet' });
    const three = [0, 13, 25].map((n) => courseFrame(n, null, 'quiet'));
    expect(suggest(three)).toEqual({ frame: 37, why: 'quiet' });
  });

  const quiet = [0, 12, 25, 37, 50].map((n) => courseFrame(n, null, 'quiet'));
  it('then looks for the rise by halves', () => {
    expect(suggest(quiet)).toEqual({ frame: 125, why: 'look-for-rise' });
    expect(suggest([...quiet, courseFrame(125, 95, 'rise')])).toEqual({
      frame: 88,
      why: 'look-for-rise',
    });
  });

  it('then what the reading still needs', () => {
    const rise = [
      courseFrame(80, 30, 'rise'),
      courseFrame(100, 60, 'rise'),
      courseFrame(130, 95, 'rise'),
    ];
    const next = suggest([...quiet, ...rise]);
    expect(next?.why).toBe('near-from');
    expect(next?.frame).toBeGreaterThan(94);
    expect(next?.frame).toBeLessThan(104);
  });

  it('is silent once the least is there', () => {
    const lifts = [30, 50, 58, 62, 75, 88, 92, 100];
    const rise = lifts.map((lift, n) => courseFrame(80 + n * 5, lift, 'rise'));
    expect(suggest([...quiet, ...rise])).toBeNull();
  });
});

import { describe, expect, it } from 'vitest';
import { madeCamera } from '#shared/evaluate/made-rep.ts';
import { framePoint } from '#shared/geometry/points.ts';
import { degrees } from '#shared/geometry/units.ts';
import type { LandmarkId, Mark, PlacedMark } from '#shared/landmarks/types.ts';
import { frameIndex, milliseconds } from '#shared/timing/units.ts';
import { ASSUMED_MARK_ERROR } from './inputs.ts';
import { isPlausible, levelFrame, markErrorPx } from './level.ts';

const placed = (over: Partial<PlacedMark> = {}): PlacedMark => ({
  hidden: false,
  point: framePoint(640, 400),
  scale: 1,
  source: 'hand',
  looked: true,
  ...over,
});

const frame = (marks: Partial<Record<LandmarkId, Mark>>) => ({
  frame: frameIndex(0),
  time: milliseconds(0),
  marks,
});

describe('the error of a mark', () => {
  it('is 0.8 of 3 px for anatomy, of 1.5 px for pointers, 1.4 times as much for outlines', () => {
    expect(markErrorPx('kneecap', placed(), ASSUMED_MARK_ERROR)).toBeCloseTo(2.4, 9);
    expect(markErrorPx('belt-tip', placed(), ASSUMED_MARK_ERROR)).toBeCloseTo(1.2, 9);
    expect(markErrorPx('outline-lifted', placed(), ASSUMED_MARK_ERROR)).toBeCloseTo(3.36, 9);
  });

  it('grows on a coarser picture, never shrinks on a finer one', () => {
    expect(markErrorPx('kneecap', placed({ scale: 3 }), ASSUMED_MARK_ERROR)).toBeCloseTo(7.2, 9);
    expect(markErrorPx('kneecap', placed({ scale: 0.5 }), ASSUMED_MARK_ERROR)).toBeCloseTo(2.4, 9);
  });

  it('is 1.7 times as much for tracked marks, looked at or not', () => {
    for (const looked of [true, false]) {
      const tracked = placed({ source: 'tracked', looked });
      expect(markErrorPx('kneecap', tracked, ASSUMED_MARK_ERROR)).toBeCloseTo(4.08, 9);
    }
  });

  it('follows the coach’s own repeatability, except on pointers', () => {
    const own = { anatomicalPx: 2, doublyMarkedFrames: 24 };
    expect(markErrorPx('kneecap', placed(), own)).toBeCloseTo(1.6, 9);
    expect(markErrorPx('thigh-tip', placed(), own)).toBeCloseTo(1.2, 9);
  });
});

describe('levelling', () => {
  it('leaves marks of a level front clip where they are', () => {
    const level = levelFrame(frame({ kneecap: placed() }), madeCamera(), ASSUMED_MARK_ERROR);
    expect(level.marks.kneecap).toMatchObject({ u: 640, v: 400, hollow: false });
  });

  it('rotates about the image centre', () => {
    const camera = { ...madeCamera(), plumbTilt: degrees(90) };
    const level = levelFrame(frame({ kneecap: placed() }), camera, ASSUMED_MARK_ERROR);
    expect(level.marks.kneecap?.u).toBeCloseTo(540 + 560, 9);
    expect(level.marks.kneecap?.v).toBeCloseTo(960 + 100, 9);
  });

  it('mirrors a picture from behind', () => {
    const level = levelFrame(frame({ kneecap: placed() }), madeCamera('back'), ASSUMED_MARK_ERROR);
    expect(level.marks.kneecap?.u).toBe(440);
  });

  it.each([
    ['front', 440],
    ['lifted-side', 440],
    ['back', 640],
  ] as const)('turns a mirrored picture from the %s back', (view, u) => {
    const camera = { ...madeCamera(view), mirrored: true };
    const level = levelFrame(frame({ kneecap: placed() }), camera, ASSUMED_MARK_ERROR);
    expect(level.marks.kneecap).toMatchObject({ u, v: 400 });
  });

  it('rotates a mirrored picture as it was recorded, then turns it back', () => {
    const camera = { ...madeCamera(), plumbTilt: degrees(90), mirrored: true };
    const level = levelFrame(frame({ kneecap: placed() }), camera, ASSUMED_MARK_ERROR);
    expect(level.marks.kneecap?.u).toBeCloseTo(1080 - (540 + 560), 9);
    expect(level.marks.kneecap?.v).toBeCloseTo(960 + 100, 9);
  });

  it('keeps hidden marks apart and drops what is not a number', () => {
    const level = levelFrame(
      frame({ kneecap: { hidden: true }, 'belt-tip': placed({ point: framePoint(NaN, 3) }) }),
      madeCamera(),
      ASSUMED_MARK_ERROR,
    );
    expect(level.hidden).toEqual(['kneecap']);
    expect(level.marks).toEqual({});
  });

  it('marks what nobody has looked at as hollow', () => {
    const hollow = placed({ source: 'tracked', looked: false });
    const level = levelFrame(frame({ kneecap: hollow }), madeCamera(), ASSUMED_MARK_ERROR);
    expect(level.marks.kneecap?.hollow).toBe(true);
  });
});

describe('a mark that no picture can hold', () => {
  it('lies further than a million pixels out, or on a picture a thousand times coarser', () => {
    const far = 1e6;
    expect(isPlausible(placed({ point: framePoint(far, -far), scale: 1000 }))).toBe(true);
    expect(isPlausible(placed({ point: framePoint(far + 1, 0) }))).toBe(false);
    expect(isPlausible(placed({ point: framePoint(0, -far - 1) }))).toBe(false);
    expect(isPlausible(placed({ scale: 1001 }))).toBe(false);
    expect(isPlausible(placed({ scale: NaN }))).toBe(false);
  });
});

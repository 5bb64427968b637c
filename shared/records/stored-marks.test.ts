import { describe, expect, it } from 'vitest';
import type { Mark } from '#shared/contracts/reps.ts';
import { frameIndex } from '#shared/timing/units.ts';
import { isLandmark, markedFrames, marksWith, valueOf } from './stored-marks.ts';

const stored = (over: Partial<Mark> = {}): Mark => ({
  frame: 4,
  landmark: 'kneecap',
  u: 10,
  v: 20,
  hidden: false,
  source: 'tracked',
  looked: false,
  confidence: 0.7,
  pictureLongEdge: 1920,
  revision: 1,
  by: { id: 'coach', name: 'A coach' },
  at: '2026-11-02T10:00:00.000Z',
  ...over,
});

const POINT = {
  to: 'point',
  point: { u: 10, v: 20 },
  source: 'tracked',
  looked: false,
  confidence: 0.7,
  pictureLongEdge: 1920,
} as const;

describe('a stored mark', () => {
  it('is a point, hidden, or nothing without a place', () => {
    expect(valueOf(stored())).toEqual(POINT);
    expect(valueOf(stored({ hidden: true, u: null, v: null }))).toEqual({ to: 'hidden' });
    expect(valueOf(stored({ u: null }))).toBeNull();
    expect(valueOf(stored({ v: null }))).toBeNull();
  });

  it('of a landmark nobody knows is left alone', () => {
    expect(isLandmark('kneecap')).toBe(true);
    expect(isLandmark('elbow')).toBe(false);
    expect(marksWith([stored({ landmark: 'elbow' }), stored({ u: null })], []).size).toBe(0);
  });
});

describe('marks by frame', () => {
  it('hold every landmark of a frame, in the order of the clip', () => {
    const marks = marksWith(
      [stored(), stored({ landmark: 'belt-tip', hidden: true }), stored({ frame: 2 })],
      [],
    );
    expect(markedFrames(marks)).toEqual([2, 4]);
    expect(marks.get(frameIndex(4))).toEqual({ kneecap: POINT, 'belt-tip': { to: 'hidden' } });
  });

  it('have what waits on this device over what is stored, the newest last', () => {
    const frame = frameIndex(4);
    const change = (after: typeof POINT | { to: 'hidden' } | null) => ({
      frame,
      landmark: 'kneecap' as const,
      after,
    });
    expect(marksWith([stored()], [change(null)]).size).toBe(0);
    const marks = marksWith([], [change(null), change({ to: 'hidden' }), change(POINT)]);
    expect(marks.get(frame)).toEqual({ kneecap: POINT });
  });
});

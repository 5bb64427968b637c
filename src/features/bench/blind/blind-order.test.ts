import { describe, expect, it } from 'vitest';
import type { Mark } from '#shared/contracts/reps.ts';
import { marksWith } from '#shared/records/stored-marks.ts';
import { frameIndex } from '#shared/timing/units.ts';
import { aSecondMarking, maren } from '#tests/support/reliability.ts';
import { blindDocument } from './blind-document.ts';
import { nextToMark, orderOf } from './blind-order.ts';

const mark = (frame: number, landmark: string, hidden = false): Mark => ({
  frame,
  landmark,
  u: hidden ? null : 1,
  v: hidden ? null : 2,
  hidden,
  source: 'hand',
  looked: true,
  confidence: null,
  pictureLongEdge: 1920,
  revision: 1,
  by: maren,
  at: '2026-03-03T16:20:00Z',
});
const FRAMES = [
  { frame: 40, landmarks: ['asis-support', 'kneecap'] },
  { frame: 7, landmarks: ['asis-support'] },
  { frame: 22, landmarks: ['asis-support'] },
];

describe('the order of a second marking', () => {
  it('stays as it was shuffled, and a frame is done once all is placed or hidden', () => {
    const marks = [mark(40, 'asis-support'), mark(7, 'asis-support', true)];
    const order = orderOf(FRAMES, marksWith(marks, []));
    expect(order.map(({ frame, done }) => [frame, done])).toEqual([
      [40, false],
      [7, true],
      [22, false],
    ]);
  });

  it('leads to the next frame that is not done, round the end, and nowhere once all are', () => {
    const order = orderOf(FRAMES, marksWith([mark(7, 'asis-support')], []));
    expect(nextToMark(order, frameIndex(40))).toBe(22);
    expect(nextToMark(order, frameIndex(22))).toBe(40);
    // a frame that is not asked for: from the beginning
    expect(nextToMark(order, frameIndex(3))).toBe(40);
    const all = order.map((each) => ({ ...each, done: true }));
    expect(nextToMark(all, frameIndex(40))).toBeNull();
  });
});

describe('what the Bench’s parts are given', () => {
  it('holds the second marks and nothing that follows from first ones', () => {
    const own = [mark(1, 'asis-support')];
    const { reps, comments, calls, otherReps, markErrors } = blindDocument(
      aSecondMarking({ marks: own }),
    );
    expect(reps).toHaveLength(1);
    expect(reps[0]?.marks).toEqual(own);
    expect(Object.values(reps[0]?.rep.boundaries ?? {})).toEqual(Array(6).fill(null));
    expect([comments, calls, otherReps, markErrors]).toEqual([[], [], [], []]);
  });
});

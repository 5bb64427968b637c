import { describe, expect, it } from 'vitest';
import type { FramePhase } from '#shared/course/types.ts';
import { STANDARD_GATES } from '#shared/protocol/protocol.ts';
import { ASKED_FRAMES, chooseFrames, type MarkableFrame, shuffled } from './asked-frames.ts';

const choose = (frames: readonly MarkableFrame[]) => chooseFrames(frames, STANDARD_GATES);

/** A rep of `quiet` quiet frames, then a rise of 5° a frame to 105°, then a lowering. */
const repOf = (quiet: number): MarkableFrame[] => {
  const rise = Array.from({ length: 22 }, (_, n) => 5 * n);
  const parts: readonly (readonly [FramePhase | null, number | null])[] = [
    ...Array.from({ length: quiet }, () => ['quiet', 0] as const),
    ...rise.map((lift) => ['rise', lift] as const),
    ...rise.toReversed().map((lift) => ['lower', lift] as const),
  ];
  return parts.map(([phase, lift], frame) => ({ frame, phase, lift }));
};

describe('the frames to mark again', () => {
  it('are three of the quiet stance, four near 60° and three near 90°, in the order of the clip', () => {
    const frames = repOf(9);
    const chosen = choose(frames);
    expect(chosen).toHaveLength(ASKED_FRAMES);
    expect(chosen).toEqual(chosen.toSorted((a, b) => a - b));
    const at = chosen.map((frame) => frames[frame]);
    // first, middle and last of the stance
    expect(chosen.slice(0, 3)).toEqual([0, 4, 8]);
    expect(at.slice(3).map((frame) => frame?.lift)).toEqual([50, 55, 60, 65, 85, 90, 95]);
    expect(at.slice(3).every((frame) => frame?.phase === 'rise')).toBe(true);
  });

  it('are filled up from the rest, evenly, where the rep has too few of these', () => {
    const lowering = repOf(0).filter(({ phase }) => phase === 'lower');
    const chosen = choose(lowering);
    expect(chosen).toHaveLength(ASKED_FRAMES);
    expect(chosen[0]).toBe(lowering[0]?.frame);
    expect(chosen.at(-1)).toBe(lowering.at(-1)?.frame);
  });

  it('never take a frame of unknown lift for one of the rise', () => {
    const frames = repOf(3).map((frame) => ({
      ...frame,
      lift: frame.frame % 2 ? null : frame.lift,
    }));
    const chosen = choose(frames);
    const near = chosen.map((n) => frames[n]).filter((frame) => frame?.phase === 'rise');
    expect(near.map((frame) => frame?.lift)).not.toContain(null);
  });

  it('are all there are of a short rep, none of none', () => {
    expect(choose(repOf(3).slice(0, 5))).toEqual([0, 1, 2, 3, 4]);
    expect(choose([])).toEqual([]);
  });
});

describe('an order that says nothing', () => {
  it('holds the same things, each place drawn from those that are left (Fisher and Yates)', () => {
    const limits: number[] = [];
    const order = shuffled(['a', 'b', 'c', 'd'], (limit) => {
      limits.push(limit);
      return 0;
    });
    expect(limits).toEqual([4, 3, 2]);
    expect(order).toEqual(['b', 'c', 'd', 'a']);
  });

  it('leaves the list it is given alone, and a draw beyond its end does nothing', () => {
    const list = [1, 2, 3];
    expect(shuffled(list, (limit) => limit - 1)).toEqual([1, 2, 3]);
    expect(shuffled(list, () => 7)).toEqual([1, 2, 3]);
    expect(list).toEqual([1, 2, 3]);
  });
});

import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { FrameIndex } from '#shared/timing/units.ts';
import { keyAtOrBefore, planDecode } from './keyframes.ts';

// the same cases in every run
fc.configureGlobal({ seed: 20260718 });

const frame = (n: number): FrameIndex => n as FrameIndex;
const keys = [0, 5, 10, 12].map(frame);

describe('keyAtOrBefore', () => {
  it.each([
    [0, 0],
    [4, 0],
    [5, 5],
    [11, 10],
    [12, 12],
    [99, 12],
  ])('for frame %i is %i', (index, key) => {
    expect(keyAtOrBefore(keys, frame(index))).toBe(key);
  });

  it('throws where no key frame comes before', () => {
    expect(() => keyAtOrBefore([frame(3)], frame(2))).toThrow(RangeError);
    expect(() => keyAtOrBefore([], frame(0))).toThrow(RangeError);
  });

  it('is the same as looking at every key', () => {
    const rising = fc
      .uniqueArray(fc.integer({ min: 1, max: 300 }), { maxLength: 40 })
      .map((list) => [0, ...list.sort((a, b) => a - b)].map(frame));
    fc.assert(
      fc.property(rising, fc.integer({ min: 0, max: 320 }), (list, n) => {
        expect(keyAtOrBefore(list, frame(n))).toBe(list.findLast((key) => key <= n));
      }),
    );
  });
});

describe('planDecode', () => {
  it('begins at the key frame after a jump', () => {
    expect(planDecode(keys, frame(8), null)).toEqual({ from: 5, to: 8 });
    expect(planDecode(keys, frame(8), frame(1))).toEqual({ from: 5, to: 8 });
  });

  it('carries on from the last packet within the same group', () => {
    expect(planDecode(keys, frame(8), frame(6))).toEqual({ from: 7, to: 8 });
  });

  it('begins anew when the wanted frame was already fed', () => {
    expect(planDecode(keys, frame(8), frame(8))).toEqual({ from: 5, to: 8 });
    expect(planDecode(keys, frame(7), frame(8))).toEqual({ from: 5, to: 7 });
  });

  it('takes a key frame alone, also right after the group before it', () => {
    expect(planDecode(keys, frame(10), frame(9))).toEqual({ from: 10, to: 10 });
  });
});

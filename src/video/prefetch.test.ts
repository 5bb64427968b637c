import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { FrameIndex } from '#shared/timing/units.ts';
import { FarthestCache } from './farthest-cache.ts';
import { nextToPrefetch, windowWithin } from './prefetch.ts';

// the same cases in every run
fc.configureGlobal({ seed: 20260718 });

const frame = (n: number): FrameIndex => n as FrameIndex;

describe('windowWithin', () => {
  it('is 45 ahead and 20 behind where the memory allows', () => {
    expect(windowWithin(256_000_000, 3_100_000)).toEqual({ ahead: 45, behind: 20 });
  });

  it('shrinks in that proportion', () => {
    expect(windowWithin(14 * 10, 10)).toEqual({ ahead: 9, behind: 4 });
  });

  it('is nothing where one picture fills the memory', () => {
    expect(windowWithin(10, 10)).toEqual({ ahead: 0, behind: 0 });
    expect(windowWithin(1, 10)).toEqual({ ahead: 0, behind: 0 });
  });
});

describe('nextToPrefetch', () => {
  const state = (playhead: number, direction: 1 | -1, held: readonly number[]) => ({
    playhead: frame(playhead),
    direction,
    frameCount: 10,
    window: { ahead: 3, behind: 2 },
    holds: (index: FrameIndex) => held.includes(index),
  });

  it('is the nearest ahead that is missing', () => {
    expect(nextToPrefetch(state(4, 1, [5]))).toBe(6);
    expect(nextToPrefetch(state(4, -1, [3]))).toBe(2);
  });

  it('is behind once all ahead are held', () => {
    expect(nextToPrefetch(state(4, 1, [5, 6, 7]))).toBe(3);
  });

  it('stops at the ends of the clip', () => {
    expect(nextToPrefetch(state(9, 1, [8]))).toBe(7);
    expect(nextToPrefetch(state(0, -1, [1, 2]))).toBeNull();
  });

  it('is nothing once the window is held', () => {
    expect(nextToPrefetch(state(4, 1, [2, 3, 5, 6, 7]))).toBeNull();
  });

  // whoever prefetches stops when the cache did not keep what was decoded
  it('comes to an end within the cache it fills, whatever the group of pictures brings along', () => {
    fc.assert(
      fc.property(
        fc.nat(199),
        fc.constantFrom<1 | -1>(1, -1),
        fc.integer({ min: 1, max: 90 }),
        fc.integer({ min: 1, max: 12 }),
        (playhead, direction, room, group) => {
          const cache = new FarthestCache<{ bytes: number }>(room * 10);
          cache.movePlayhead(playhead);
          cache.put(playhead, { bytes: 10 });
          const window = windowWithin(cache.budgetBytes, 10);
          let rounds = 0;
          for (;;) {
            const holds = (index: FrameIndex) => cache.has(index);
            const at = { playhead: frame(playhead), direction, frameCount: 200, window, holds };
            const next = nextToPrefetch(at);
            if (next === null) break;
            const key = next - (next % group);
            for (let n = key; n <= next; n += 1) cache.put(n, { bytes: 10 });
            rounds += 1;
            expect(rounds).toBeLessThanOrEqual(70);
            if (!cache.has(next)) break;
          }
          expect(cache.has(playhead)).toBe(true);
        },
      ),
    );
  });
});

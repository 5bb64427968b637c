import { describe, expect, it } from 'vitest';
import { timeWords } from './time-taken.tsx';

const clock = { firstTouch: 5_000, lastTouch: 47_000, followed: 107_000, looked: 137_400 };

describe('how long it took', () => {
  it('is told part by part', () => {
    expect(timeWords(clock, 3_460, 72.4)).toBe(
      'This took: preparing the clip 1 min 12 s, marking 42 s, following 1 min 0 s, looking 30 s, the reading 3.5 s.',
    );
  });
  it('leaves out what is not known', () => {
    expect(timeWords({ ...clock, looked: null }, null, null)).toBe(
      'This took: marking 42 s, following 1 min 0 s.',
    );
  });
  it('is not told where nothing was followed', () => {
    expect(timeWords({ ...clock, followed: null }, 3_460, 72.4)).toBeNull();
  });
});

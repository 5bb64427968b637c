import { describe, expect, it } from 'vitest';
import { afterError, MOST_TRIES, withNextTry } from './tries.ts';

const going = { aborted: false };
const stopped = { aborted: true };

describe('tries', () => {
  it('are counted as they begin, until none is left', () => {
    expect(withNextTry(0)).toBe(1);
    expect(withNextTry(MOST_TRIES - 1)).toBe(MOST_TRIES);
    expect(withNextTry(MOST_TRIES)).toBeNull();
  });

  it('end with the error of the last', () => {
    expect(afterError(MOST_TRIES - 1, going)).toEqual({ tries: MOST_TRIES - 1, wasLast: false });
    expect(afterError(MOST_TRIES, going)).toEqual({ tries: MOST_TRIES, wasLast: true });
  });

  it('are given back where the worker was stopped', () => {
    expect(afterError(MOST_TRIES, stopped)).toEqual({ tries: MOST_TRIES - 1, wasLast: false });
    expect(afterError(0, stopped)).toEqual({ tries: 0, wasLast: false });
  });
});

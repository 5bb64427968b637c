import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { atSameTime } from './same-time.ts';

beforeEach(() => {
  vi.useFakeTimers({ toFake: ['performance', 'setTimeout'] });
});
afterEach(() => {
  vi.useRealTimers();
});

/** When the answer came, on a clock that only this test moves. */
const answeredAt = async (takesMs: number, fails = false): Promise<number> => {
  const began = performance.now();
  const answer = atSameTime(250, async () => {
    await new Promise((resolve) => setTimeout(resolve, takesMs));
    if (fails) throw new Error('no');
  }).then(
    () => performance.now() - began,
    () => performance.now() - began,
  );
  await vi.advanceTimersByTimeAsync(2000);
  return answer;
};

describe('atSameTime', () => {
  it.each([
    [1, 250],
    [249, 250],
    [260, 500],
  ])('answers work of %i ms after %i ms', async (takes, after) => {
    expect(await answeredAt(takes)).toBe(after);
    expect(await answeredAt(takes, true)).toBe(after);
  });
});

import { describe, expect, it } from 'vitest';
import { createScrubScheduler } from './scrub-scheduler.ts';

const setUp = () => {
  const begun: number[] = [];
  const failures: [unknown, number][] = [];
  const signals: AbortSignal[] = [];
  const ends: { finish: () => void; fail: (error: Error) => void }[] = [];
  const scheduler = createScrubScheduler<number>(
    (place, signal) =>
      new Promise((resolve, reject) => {
        begun.push(place);
        signals.push(signal);
        ends.push({ finish: resolve, fail: reject });
      }),
    (error, place) => failures.push([error, place]),
  );
  const settle = async (n: number, how: 'finish' | Error): Promise<void> => {
    if (how === 'finish') ends[n]?.finish();
    else ends[n]?.fail(how);
    await new Promise((resolve) => setImmediate(resolve));
  };
  return { scheduler, begun, failures, signals, settle };
};

describe('the scrub scheduler', () => {
  it('keeps one request in flight, then takes the newest wanted', async () => {
    const { scheduler, begun, settle } = setUp();
    for (const place of [1, 2, 3, 4]) scheduler.want(place);
    expect(begun).toEqual([1]);
    await settle(0, 'finish');
    expect(begun).toEqual([1, 4]);
    await settle(1, 'finish');
    expect(begun).toEqual([1, 4]);
  });

  it('begins again after it was idle', async () => {
    const { scheduler, begun, settle } = setUp();
    scheduler.want(1);
    await settle(0, 'finish');
    await scheduler.idle();
    scheduler.want(2);
    expect(begun).toEqual([1, 2]);
  });

  it('reports a failure and goes on', async () => {
    const { scheduler, begun, failures, settle } = setUp();
    const error = new Error('no picture');
    scheduler.want(1);
    scheduler.want(2);
    await settle(0, error);
    expect(failures).toEqual([[error, 1]]);
    expect(begun).toEqual([1, 2]);
  });

  it('forgets and aborts on stop, and says nothing of what that breaks', async () => {
    const { scheduler, begun, failures, signals, settle } = setUp();
    scheduler.want(1);
    scheduler.want(2);
    scheduler.stop();
    expect(signals[0]?.aborted).toBe(true);
    await settle(0, new Error('aborted'));
    expect(begun).toEqual([1]);
    expect(failures).toEqual([]);
    scheduler.want(3);
    expect(begun).toEqual([1, 3]);
    expect(signals[1]?.aborted).toBe(false);
  });
});

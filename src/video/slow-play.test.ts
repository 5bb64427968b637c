import { describe, expect, it } from 'vitest';
import type { FrameIndex, Milliseconds } from '#shared/timing/units.ts';
import { playSlowly } from './slow-play.ts';

const table = Array.from({ length: 40 }, (_, n) => n * 10) as Milliseconds[];
const span = { from: 0 as FrameIndex, to: 39 as FrameIndex };

/** A heartbeat driven by hand and pictures that come when told to. */
const setUp = (rate: number, from = 0) => {
  let time = 0;
  let beat: ((now: number) => void) | null = null;
  const shown: number[] = [];
  const told: string[] = [];
  let release: () => void = () => undefined;
  let slow = false;
  let fault: Error | null = null;
  const stop = playSlowly(
    table,
    { span, from: from as FrameIndex, rate, loop: false },
    {
      show: async (index) => {
        if (fault) throw fault;
        if (slow) await new Promise<void>((resolve) => (release = resolve));
        shown.push(index);
      },
      ended: () => told.push('ended'),
      failed: (error) => told.push(String(error)),
    },
    { now: () => time, next: (b) => ((beat = b), 1), cancel: () => (beat = null) },
  );
  const beatAt = async (now: number): Promise<void> => {
    time = now;
    const b = beat;
    beat = null;
    b?.(now);
    await new Promise((resolve) => setImmediate(resolve));
  };
  return {
    shown,
    told,
    stop,
    beatAt,
    beats: () => beat !== null,
    slowDown: () => (slow = true),
    speedUp: () => ((slow = false), release()),
    breakWith: (error: Error) => (fault = error),
  };
};

describe('playSlowly', () => {
  it('asks for a frame once, when it is due', async () => {
    const play = setUp(0.5);
    for (const now of [0, 16, 32, 48, 64]) await play.beatAt(now);
    expect(play.shown).toEqual([0, 1, 2, 3]);
  });

  it('skips frames to keep time while pictures are only a little late', async () => {
    const play = setUp(1);
    await play.beatAt(0);
    play.slowDown();
    await play.beatAt(10);
    await play.beatAt(60);
    play.speedUp();
    await play.beatAt(90);
    await play.beatAt(91);
    expect(play.shown).toEqual([0, 1, 9]);
  });

  it('waits for a picture that is very late instead of leaping', async () => {
    const play = setUp(1);
    await play.beatAt(0);
    play.slowDown();
    await play.beatAt(10);
    await play.beatAt(161);
    await play.beatAt(5000);
    play.speedUp();
    await play.beatAt(5000);
    await play.beatAt(5010);
    await play.beatAt(5020);
    expect(play.shown).toEqual([0, 1, 16, 17]);
  });

  it('ends after the last frame', async () => {
    const play = setUp(1, 38);
    for (const now of [0, 10, 19, 20]) await play.beatAt(now);
    expect(play.shown).toEqual([38, 39]);
    expect(play.told).toEqual(['ended']);
    expect(play.beats()).toBe(false);
  });

  it('stops at the first failure and says so once', async () => {
    const play = setUp(1);
    await play.beatAt(0);
    play.breakWith(new Error('gone'));
    await play.beatAt(10);
    expect(play.told).toEqual(['Error: gone']);
    expect(play.beats()).toBe(false);
  });

  it('says nothing more once it was stopped', async () => {
    const play = setUp(1);
    await play.beatAt(0);
    play.stop();
    await play.beatAt(10);
    expect(play.shown).toEqual([0]);
    expect(play.told).toEqual([]);
  });
});

import type { FrameIndex, Milliseconds } from '#shared/timing/units.ts';
import { PlayClock, type PlayPlan } from './play-clock.ts';

/** A picture later than this holds the clock; up to then play skips frames to keep time. */
const LATE_MS = 150;

export interface PlayHooks {
  /** Brings the frame onto the canvas; the next one is asked for when this has settled. */
  readonly show: (index: FrameIndex, signal: AbortSignal) => Promise<void>;
  /** Called once, after the last frame of a span that does not loop was shown. */
  readonly ended?: () => void;
  /** Called once, after which play has stopped. */
  readonly failed: (error: unknown) => void;
}

/** The browser's heartbeat; replaced in tests. */
export interface Heartbeat {
  readonly now: () => number;
  readonly next: (beat: (now: number) => void) => number;
  readonly cancel: (handle: number) => void;
}

const animationFrames: Heartbeat = {
  now: () => performance.now(),
  next: (beat) => requestAnimationFrame(beat),
  cancel: (handle) => cancelAnimationFrame(handle),
};

/**
 * Plays a span by frame index and time stamps at any rate. Answers the way to stop it.
 * One frame is on its way at a time; when it is late the clock waits, so nothing is leapt over.
 */
export const playSlowly = (
  table: readonly Milliseconds[],
  plan: PlayPlan,
  hooks: PlayHooks,
  heartbeat: Heartbeat = animationFrames,
): (() => void) => {
  const clock = new PlayClock(table, plan, heartbeat.now());
  const stopper = new AbortController();
  let handle = 0;
  let shown: FrameIndex | null = null;
  let askedAt: number | null = null;

  const stop = (): void => {
    stopper.abort();
    heartbeat.cancel(handle);
  };

  const ask = async (index: FrameIndex): Promise<void> => {
    try {
      await hooks.show(index, stopper.signal);
      shown = index;
    } catch (error) {
      if (stopper.signal.aborted) return;
      stop();
      hooks.failed(error);
    } finally {
      askedAt = null;
    }
  };

  const beat = (now: number): void => {
    if (askedAt === null) {
      clock.resume(now);
      const { index, ended } = clock.due(now);
      if (index !== shown) {
        askedAt = now;
        void ask(index);
      } else if (ended) {
        stop();
        hooks.ended?.();
        return;
      }
    } else if (now - askedAt > LATE_MS) clock.hold(now);
    handle = heartbeat.next(beat);
  };

  handle = heartbeat.next(beat);
  return stop;
};

import type { FrameIndex } from '#shared/timing/units.ts';

/** Frames to have ready in the direction of stepping and against it. */
const AHEAD = 45;
const BEHIND = 20;

export interface PrefetchWindow {
  readonly ahead: number;
  readonly behind: number;
}

/**
 * 45 ahead and 20 behind, shrunk in that proportion until the window and the frame at the playhead
 * fit into the budget: a window larger than the cache would evict what it just fetched, for ever.
 */
export const windowWithin = (budgetBytes: number, bytesPerPicture: number): PrefetchWindow => {
  const room = Math.max(0, Math.floor(budgetBytes / bytesPerPicture) - 1);
  if (room >= AHEAD + BEHIND) return { ahead: AHEAD, behind: BEHIND };
  const behind = Math.floor((room * BEHIND) / (AHEAD + BEHIND));
  return { ahead: room - behind, behind };
};

export interface PrefetchState {
  readonly playhead: FrameIndex;
  /** 1 while stepping forward, -1 while stepping back. */
  readonly direction: 1 | -1;
  readonly frameCount: number;
  readonly window: PrefetchWindow;
  readonly holds: (index: FrameIndex) => boolean;
}

/** The next frame worth decoding, nearest first and ahead before behind; null when all are held. */
export const nextToPrefetch = (state: PrefetchState): FrameIndex | null => {
  const { playhead, direction, frameCount, window, holds } = state;
  const firstMissing = (count: number, way: number): FrameIndex | null => {
    for (let step = 1; step <= count; step += 1) {
      const index = playhead + way * step;
      if (index < 0 || index >= frameCount) return null;
      if (!holds(index as FrameIndex)) return index as FrameIndex;
    }
    return null;
  };
  return firstMissing(window.ahead, direction) ?? firstMissing(window.behind, -direction);
};

import type { FrameIndex } from '#shared/timing/units.ts';

/** One moment of two films: a frame of each. */
export interface FramePair {
  readonly first: { readonly frame: FrameIndex };
  readonly second: { readonly frame: FrameIndex };
}

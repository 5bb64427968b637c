import type { FramePoint } from '#shared/geometry/points.ts';
import type { LandmarkId } from '#shared/landmarks/types.ts';

/** What the hand is doing right now. None of it lasts: it is forgotten unless the gesture ends well. */
export interface HandState {
  /** Where the pointer is; null where it is not over the clip. */
  readonly aim: FramePoint | null;
  /** Where the keyboard's cross was moved to; null where it stands at the expected place. */
  readonly cross: FramePoint | null;
  /** True while a pointer is held down to place a mark. */
  readonly holding: boolean;
  /** A mark that is being dragged or nudged, and where it is now. */
  readonly moved: { readonly landmark: LandmarkId; readonly point: FramePoint } | null;
}

/** A small observable that stage, magnifier and handles share without rendering the page anew. */
export interface Hand {
  readonly get: () => HandState;
  readonly set: (change: Partial<HandState>) => void;
  readonly subscribe: (listener: () => void) => () => void;
}

const IDLE: HandState = { aim: null, cross: null, holding: false, moved: null };

export const createHand = (): Hand => {
  let state = IDLE;
  const listeners = new Set<() => void>();
  return {
    get: () => state,
    set(change) {
      state = { ...state, ...change };
      for (const listener of listeners) listener();
    },
    subscribe(listener) {
      listeners.add(listener);
      return () => void listeners.delete(listener);
    },
  };
};

/** What the magnifier looks at: a moved mark, else the pointer, else the keyboard's cross. */
export const lookedAt = (state: HandState): FramePoint | null =>
  state.moved?.point ?? state.aim ?? state.cross;

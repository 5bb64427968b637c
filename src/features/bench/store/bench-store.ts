import { createStore, type StoreApi } from 'zustand/vanilla';
import type { ClipGeometry } from '#shared/contracts/clips.ts';
import type { MarkingCommand } from '#shared/landmarks/commands.ts';
import { emptyHistory, type History } from '#shared/landmarks/commands-history.ts';
import type { LandmarkId } from '#shared/landmarks/types.ts';
import type { FrameIndex } from '#shared/timing/units.ts';
import type { Viewport } from '#src/canvas/viewport.ts';
import type { RepChange } from '../actions/rep-change.ts';
import { loadTaste, saveTaste, type Taste } from './taste.ts';
import { LOOK, MARK, type Tool } from './tools.ts';

/** One step of undo: what was done, and what takes it back. */
export type BenchStep =
  | {
      readonly kind: 'marks';
      readonly repId: string;
      readonly commands: readonly MarkingCommand[];
    }
  | {
      readonly kind: 'rep';
      readonly repId: string;
      readonly before: RepChange;
      readonly after: RepChange;
    }
  | { readonly kind: 'clip'; readonly before: ClipGeometry; readonly after: ClipGeometry };

/** What the right side of the Bench shows. */
export type Desk = 'course' | 'reps' | 'set-up' | 'comments';

export interface BenchState {
  readonly frame: FrameIndex;
  readonly repId: string | null;
  /** Null shows the whole picture. */
  readonly viewport: Viewport | null;
  readonly tool: Tool;
  /** A landmark that was asked for by hand; null: the next one by itself. */
  readonly chosen: LandmarkId | null;
  /** Where leading goes on from. */
  readonly lastPlaced: LandmarkId | null;
  readonly desk: Desk;
  readonly playing: boolean;
  /** The list of keys is open. */
  readonly keysOpen: boolean;
  readonly history: History<BenchStep>;
  readonly taste: Taste;
}

export type BenchStore = StoreApi<BenchState>;

/** Tool, selection, zoom and undo of one open clip. Nothing in it outlives the page but the taste. */
export const createBenchStore = (
  start: Pick<BenchState, 'frame' | 'repId' | 'desk'> & { readonly mayMark: boolean },
): BenchStore => {
  const store = createStore<BenchState>(() => ({
    frame: start.frame,
    repId: start.repId,
    desk: start.desk,
    viewport: null,
    tool: start.mayMark ? MARK : LOOK,
    chosen: null,
    lastPlaced: null,
    playing: false,
    keysOpen: false,
    history: emptyHistory(),
    taste: loadTaste(),
  }));
  store.subscribe((state, before) => {
    if (state.taste !== before.taste) saveTaste(state.taste);
  });
  return store;
};

/** Shows another frame; leading begins anew there. */
export const goTo = (store: BenchStore, frame: FrameIndex): void => {
  if (store.getState().frame === frame) return;
  store.setState({ frame, chosen: null, lastPlaced: null });
};

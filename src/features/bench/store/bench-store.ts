import { createStore, type StoreApi } from 'zustand/vanilla';
import type { ClipGeometry } from '#shared/contracts/clips.ts';
import type { MarkingCommand } from '#shared/landmarks/commands.ts';
import { emptyHistory, type History } from '#shared/landmarks/commands-history.ts';
import type { LandmarkId } from '#shared/landmarks/types.ts';
import type { FrameIndex } from '#shared/timing/units.ts';
import type { Viewport } from '#src/canvas/viewport.ts';
import { NO_TOUCHES, type StandsOn, type Touches } from '../model/draft.ts';
import type { RepChange } from '../actions/rep-change.ts';
import type { KeptTouches } from './kept-touches.ts';
import { loadTaste, saveTaste, type Taste } from './taste.ts';
import { LOOK, MARK, type Tool } from './tools.ts';

export interface RepMarks {
  readonly repId: string;
  readonly commands: readonly MarkingCommand[];
}

/** One step of undo: what was done, and what takes it back. */
export type BenchStep =
  | ({ readonly kind: 'marks' } & RepMarks)
  /** Marks of several reps that came at once: carried by the computer, or confirmed together. */
  | {
      readonly kind: 'many-marks';
      readonly parts: readonly RepMarks[];
      /** The frame on which a hand began it; absent: the first of the marks. */
      readonly shown?: FrameIndex;
    }
  /** Marks placed before there is a rep. */
  | { readonly kind: 'touches'; readonly before: Touches; readonly after: Touches }
  | {
      readonly kind: 'rep';
      readonly repId: string;
      readonly before: RepChange;
      readonly after: RepChange;
    }
  | { readonly kind: 'clip'; readonly before: ClipGeometry; readonly after: ClipGeometry };

/** What the right side of the Bench shows. */
export type Desk = 'course' | 'reps' | 'look' | 'set-up' | 'head' | 'comments';

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
  /** Only while the clip has no rep. */
  readonly touches: Touches;
  /** False where this device keeps no touches: a reload loses them. */
  readonly touchesKept: boolean;
  readonly standsOn: StandsOn;
  /** The list of keys is open. */
  readonly keysOpen: boolean;
  readonly history: History<BenchStep>;
  readonly taste: Taste;
}

export type BenchStore = StoreApi<BenchState>;

/** Tool, selection, zoom and undo of one open clip. Only the taste and the touches outlive the page. */
export const createBenchStore = (
  start: Pick<BenchState, 'frame' | 'repId' | 'desk'> & {
    readonly mayMark: boolean;
    /** What the clip is said to hold. */
    readonly standsOn?: StandsOn;
    readonly kept?: KeptTouches;
  },
): BenchStore => {
  const { kept } = start;
  const earlier = kept?.load();
  const store = createStore<BenchState>(() => ({
    frame: start.frame,
    repId: start.repId,
    desk: start.desk,
    standsOn: earlier?.standsOn ?? start.standsOn ?? 'both',
    touches: earlier?.touches ?? NO_TOUCHES,
    touchesKept: true,
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
    const { touches, standsOn } = state;
    if (!kept || (touches === before.touches && standsOn === before.standsOn)) return;
    const touchesKept = kept.save({ touches, standsOn });
    if (touchesKept !== state.touchesKept) store.setState({ touchesKept });
  });
  return store;
};

/** Shows another frame; leading begins anew there. */
export const goTo = (store: BenchStore, frame: FrameIndex): void => {
  if (store.getState().frame === frame) return;
  store.setState({ frame, chosen: null, lastPlaced: null });
};

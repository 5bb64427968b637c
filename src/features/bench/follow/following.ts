import { createStore, type StoreApi } from 'zustand/vanilla';
import type { FoundRep, NoReps } from '#shared/course/find-reps.ts';
import type { FramePoint } from '#shared/geometry/points.ts';
import type { SpotId } from '#shared/landmarks/spots.ts';
import type { LandmarkId } from '#shared/landmarks/types.ts';
import type { FrameIndex } from '#shared/timing/units.ts';
import type {
  Followed,
  FollowProgress,
  PointToFollow,
  RefusalCode,
  Touch,
  Tracker,
} from '#src/tracking/types.ts';

/** Where a place on the body is, by frame; null where nobody looked or it is lost. */
export type Places = readonly (Followed | null)[];
export type Tracks = ReadonlyMap<SpotId, Places>;

/** What the computer is doing with the marks. */
export type Run =
  | { readonly is: 'idle' }
  | ({ readonly is: 'following' } & FollowProgress)
  | { readonly is: 'failed'; readonly message: string };

/** What was seen of the last touch. */
export type Said =
  | {
      readonly is: 'snapped';
      readonly landmark: LandmarkId;
      readonly frame: FrameIndex;
      /** Where the hand touched; Escape brings the mark back there. */
      readonly touched: FramePoint;
    }
  | { readonly is: 'refused'; readonly landmark: LandmarkId; readonly code: RefusalCode };

/** When things were done, ms since the page began; null: not yet. */
export interface Clock {
  readonly firstTouch: number | null;
  readonly lastTouch: number | null;
  readonly followed: number | null;
  readonly looked: number | null;
}

export interface FollowState {
  /** Found reps are being named: their marks come with them. */
  readonly taking: boolean;
  readonly said: Said | null;
  readonly clock: Clock;
  readonly run: Run;
  readonly tracks: Tracks;
  /** Places that could not be followed from where they were touched. */
  readonly refused: ReadonlyMap<SpotId, RefusalCode>;
  /** What the ankles say of the reps; null until they were followed. */
  readonly found: readonly FoundRep[] | NoReps | null;
}

export interface FollowOutcome {
  readonly tracks: Tracks;
  readonly refused: ReadonlyMap<SpotId, RefusalCode>;
}

/** Marks that follow, for one open clip. The tracker is opened when it is first needed. */
export interface Following {
  readonly store: StoreApi<FollowState>;
  /** Is there a dot, can it be followed? Null where this browser cannot tell. */
  readonly look: (frame: FrameIndex, point: FramePoint) => Promise<Touch | null>;
  /** Follows places through a span; null where it was stopped or failed, which the store says. */
  readonly follow: (
    points: readonly (Omit<PointToFollow, 'id'> & { readonly id: SpotId })[],
    from: FrameIndex,
    to: FrameIndex,
  ) => Promise<FollowOutcome | null>;
  readonly stop: () => void;
  /** The person steps: following waits. */
  readonly giveWay: () => void;
  readonly close: () => void;
}

const IDLE: Run = { is: 'idle' };

export const createFollowing = (
  open: (signal: AbortSignal) => Promise<Tracker>,
  frames: number,
): Following => {
  const store = createStore<FollowState>(() => ({
    taking: false,
    said: null,
    clock: { firstTouch: null, lastTouch: null, followed: null, looked: null },
    run: IDLE,
    tracks: new Map(),
    refused: new Map(),
    found: null,
  }));
  let closing = new AbortController();
  let opening: Promise<Tracker> | null = null;
  let opened: Tracker | null = null;
  let stopper: AbortController | null = null;

  const tracker = (): Promise<Tracker> => {
    opening ??= open(closing.signal).then(
      (ready) => (opened = ready),
      (error: unknown) => {
        // the next touch tries again
        opening = null;
        throw error;
      },
    );
    return opening;
  };

  return {
    store,
    async look(frame, point) {
      try {
        return await (await tracker()).look(frame, point);
      } catch {
        // a touch that nobody looked at is a mark all the same
        return null;
      }
    },
    async follow(points, from, to) {
      stopper?.abort();
      const own = (stopper = new AbortController());
      const mine = (): boolean => stopper === own;
      const total = to - from + 1;
      store.setState({ run: { is: 'following', done: 0, total, held: false } });
      try {
        const ready = await tracker();
        const answer = await ready.follow(
          { points, from, to },
          {
            signal: own.signal,
            onProgress: (progress) => {
              if (mine()) store.setState({ run: { is: 'following', ...progress } });
            },
          },
        );
        if (!mine()) return null;
        const tracks = new Map(
          answer.tracks.map(({ id, places }): [SpotId, Places] => {
            const byFrame = new Array<Followed | null>(frames).fill(null);
            for (const place of places) byFrame[place.frame] = place;
            return [id as SpotId, byFrame];
          }),
        );
        const refused = new Map(answer.refused.map(({ id, code }) => [id as SpotId, code]));
        store.setState({ run: IDLE });
        return { tracks, refused };
      } catch (error) {
        if (!mine()) return null;
        const message = error instanceof Error ? error.message : 'The marks could not be followed.';
        store.setState({ run: own.signal.aborted ? IDLE : { is: 'failed', message } });
        return null;
      }
    },
    stop() {
      stopper?.abort();
    },
    giveWay: () => opened?.giveWay(),
    close() {
      closing.abort();
      // a page that is mounted anew opens it anew
      closing = new AbortController();
      stopper?.abort();
      stopper = null;
      opened?.close();
      opened = null;
      opening = null;
    },
  };
};

/** New places over the old ones, frame by frame within a span. */
export const withTracks = (old: Tracks, more: Tracks, from: number, to: number): Tracks => {
  const next = new Map(old);
  for (const [spot, places] of more) {
    const before = old.get(spot);
    next.set(
      spot,
      before
        ? before.map((place, frame) =>
            from <= frame && frame <= to ? (places[frame] ?? null) : place,
          )
        : places,
    );
  }
  return next;
};

import { TrackingError } from '#src/tracking/errors.ts';
import type {
  Followed,
  FollowProgress,
  FollowResult,
  Touch,
  Tracker,
} from '#src/tracking/types.ts';
import { openTracker } from '#src/tracking/worker/open-tracker.ts';
import { framePoint } from '#shared/geometry/points.ts';
import type { frameIndex } from '#shared/timing/units.ts';
import { frameTimes } from '#src/video/frame-times.ts';
import type { OpenRequest } from './page.ts';

export interface PlainRequest {
  readonly from: number;
  readonly to: number;
  readonly points: readonly {
    readonly id: string;
    readonly keyframes: readonly {
      readonly frame: number;
      readonly u: number;
      readonly v: number;
    }[];
  }[];
}

interface Run {
  readonly result: FollowResult | string;
  readonly progress: FollowProgress[];
  readonly told: Record<string, Followed[]>;
}

let tracker: Tracker | null = null;
const now = (): Tracker => {
  if (!tracker) throw new Error('Open a clip first.');
  return tracker;
};
const coded = (error: unknown): string =>
  error instanceof TrackingError ? error.code : error instanceof Error ? error.name : String(error);

const typed = ({ from, to, points }: PlainRequest) => ({
  from: from as ReturnType<typeof frameIndex>,
  to: to as ReturnType<typeof frameIndex>,
  points: points.map(({ id, keyframes }) => ({
    id,
    keyframes: keyframes.map(({ frame, u, v }) => ({
      frame: frame as ReturnType<typeof frameIndex>,
      point: framePoint(u, v),
    })),
  })),
});

const tracking = {
  async open({ sheets, begin, ...clip }: OpenRequest, enlarged = 1): Promise<string> {
    tracker?.close();
    const { width: tileWidth, height: tileHeight } = clip;
    const layout = sheets && {
      ...{ ...sheets, tileWidth, tileHeight },
      sheetUrl: (n: number) => `${sheets.prefix}${n}.jpg`,
    };
    try {
      tracker = await openTracker(
        {
          clip: { ...clip, frameTable: frameTimes(clip), ...(layout && { sheets: layout }) },
          source: { width: clip.width * enlarged, height: clip.height * enlarged },
        },
        begin === 'sheets' ? { begin } : {},
      );
      return tracker.kind;
    } catch (error) {
      return coded(error);
    }
  },

  async follow(request: PlainRequest, abortAfter?: number): Promise<Run> {
    const stopper = new AbortController();
    const progress: FollowProgress[] = [];
    const told: Record<string, Followed[]> = {};
    const result = await now()
      .follow(typed(request), {
        signal: stopper.signal,
        onProgress: (news) => {
          progress.push(news);
          if (abortAfter !== undefined && news.done >= abortAfter) stopper.abort();
        },
        onPlaces: (id, places) => (told[id] ??= []).push(...places),
      })
      .catch(coded);
    return { result, progress, told };
  },

  look: (frame: number, u: number, v: number): Promise<Touch | string> =>
    now()
      .look(frame as ReturnType<typeof frameIndex>, framePoint(u, v))
      .catch(coded),

  /** Steps through the clip while it follows: how long it took and how often it was held. */
  async giveWay(request: PlainRequest, steps: number): Promise<{ ms: number; held: number }> {
    let held = 0;
    const start = performance.now();
    const following = now().follow(typed(request), {
      onProgress: (news) => (held += Number(news.held)),
    });
    for (let k = 0; k < steps; k += 1) {
      now().giveWay();
      await new Promise((resolve) => setTimeout(resolve, 100));
    }
    await following;
    return { ms: performance.now() - start, held };
  },

  async closeWhile(request: PlainRequest): Promise<string> {
    const following = now()
      .follow(typed(request))
      .then(() => 'followed', coded);
    now().close();
    return following;
  },
};

export type TrackingHarness = typeof tracking;
declare global {
  interface Window {
    tracking: TrackingHarness;
  }
}
window.tracking = tracking;

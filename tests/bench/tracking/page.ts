import { frameIndex } from '#shared/timing/units.ts';
import { Follower } from '#src/tracking/core/follower.ts';
import { toPicture } from '#src/tracking/core/scale.ts';
import type { PointToFollow } from '#src/tracking/types.ts';
import { DecodedPictures } from '#src/tracking/worker/decoded-pictures.ts';
import { openTracker } from '#src/tracking/worker/open-tracker.ts';
import { createCanvasPainter } from '#src/video/canvas-painter.ts';
import { frameTimes } from '#src/video/frame-times.ts';
import { openClip } from '#src/video/open-clip.ts';
import type { BenchClip } from '../video/page.ts';

const canvas = document.querySelector('canvas') ?? document.createElement('canvas');
const painter = createCanvasPainter(canvas);
const pause = (ms: number): Promise<void> => new Promise((resolve) => setTimeout(resolve, ms));

/** Of each frame, ms. */
export interface Costs {
  readonly decoding: number[];
  readonly following: number[];
}

export interface Steps {
  readonly alone: number[];
  readonly followed: number[];
}

const bench = {
  /** Decodes the frames one after another and follows the points on each: both by this thread's clock. */
  async costs(clip: BenchClip, points: readonly PointToFollow[], last: number): Promise<Costs> {
    const pictures = await DecodedPictures.open({ ...clip, frameTable: frameTimes(clip) });
    const begin = await pictures.picture(frameIndex(0), null);
    const followers = points.map(({ keyframes }) => {
      const point = keyframes[0]?.point;
      if (!point) throw new RangeError('a point without a keyframe');
      return new Follower(begin, toPicture(point, clip, begin));
    });
    const costs: Costs = { decoding: [], following: [] };
    for (let n = 1; n <= last; n += 1) {
      const start = performance.now();
      const picture = await pictures.picture(frameIndex(n), null);
      const decoded = performance.now();
      for (const follower of followers) follower.step(picture);
      costs.decoding.push(decoded - start);
      costs.following.push(performance.now() - decoded);
    }
    pictures.close();
    return costs;
  },

  /** Cached steps without and with marks being followed, in turns. */
  async steps(
    clip: BenchClip,
    points: readonly PointToFollow[],
    turns: number,
    length: number,
  ): Promise<Steps> {
    const prepared = { ...clip, frameTable: frameTimes(clip) };
    const source = await openClip(prepared);
    const tracker = await openTracker({ clip: prepared, source: clip });
    const steps: Steps = { alone: [], followed: [] };
    const last = frameIndex(prepared.frameTable.length - 1);
    const walk = async (times: number[], stepped: () => void): Promise<void> => {
      for (let n = 1; n <= length; n += 1) {
        await pause(60);
        const start = performance.now();
        stepped();
        await painter.show(await source.frame(frameIndex(n), { intent: 'step' }));
        times.push(performance.now() - start);
      }
    };
    for (let turn = 0; turn < turns; turn += 1) {
      // the first walk of all fills the cache
      await walk(turn === 0 ? [] : steps.alone, () => undefined);
      const stopper = new AbortController();
      const following = tracker
        .follow({ points, from: frameIndex(0), to: last }, { signal: stopper.signal })
        .catch(() => undefined);
      await pause(100);
      await walk(turn === 0 ? [] : steps.followed, () => tracker.giveWay());
      stopper.abort();
      await following;
      await pause(300);
    }
    tracker.close();
    source.close();
    return steps;
  },
};

export type TrackingBench = typeof bench;
declare global {
  interface Window {
    trackingBench: TrackingBench;
  }
}
window.trackingBench = bench;

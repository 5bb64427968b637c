import { createCanvasPainter } from '#src/video/canvas-painter.ts';
import { presentedFrame } from '#src/video/exact-seek.ts';
import { frameTimes, middleOfFrame, type TickTable } from '#src/video/frame-times.ts';
import { openClip } from '#src/video/open-clip.ts';
import type { FrameIntent, FrameSource } from '#src/video/types.ts';
import type { FrameIndex, Milliseconds } from '#shared/timing/units.ts';
import { numberBox, readNumber } from '../../fixtures/video/number-pattern.ts';

export interface BenchClip extends TickTable {
  readonly url: string;
  readonly width: number;
  readonly height: number;
}

/** Milliseconds per request, and how often another frame than the one asked for was shown. */
export interface Timings {
  /**
   * Until the page's rendering step that presents the wanted frame: the video frame callback of
   * the browser's video, the next animation frame after our pixels are on the canvas.
   */
  readonly presented: number[];
  /**
   * Until the picture is ready for that step. Not comparable to the letter: ours is pixels on the
   * canvas, the browser's `presentationTime` a decoded frame that is yet to be converted.
   */
  readonly ready: number[];
  wrong: number;
}

interface Shown {
  readonly presented: number;
  readonly ready: number;
}

const LATE_MS = 5000;
const canvas = document.querySelector('canvas') ?? document.createElement('canvas');
const painter = createCanvasPainter(canvas);
const video = document.createElement('video');
video.muted = true;
video.preload = 'auto';
document.body.append(video);
// both shown, at the same size: what is not visible need not be composed
for (const shown of [canvas, video]) shown.style.width = '640px';

const nextBeat = (): Promise<number> => new Promise((resolve) => requestAnimationFrame(resolve));

const numberShown = (): number | null => {
  const { width, height } = canvas;
  const box = numberBox(width, height);
  const pixels = canvas.getContext('2d')?.getImageData(box.x, box.y, box.width, box.height).data;
  return pixels ? readNumber(pixels, width, height) : null;
};

let table: Milliseconds[] = [];
let source: FrameSource | null = null;

const loaded = (opened: FrameSource): Promise<void> =>
  new Promise((resolve) => {
    opened.onProgress(({ share }) => {
      if (share >= 1) resolve();
    });
  });

/** Seeks to the middle of the frame's time, which the browser shows right, and waits for it. */
const browserShows = (wanted: number): Promise<Shown | null> =>
  new Promise((resolve) => {
    const start = performance.now();
    const late = setTimeout(() => resolve(null), LATE_MS);
    const hear = (_: number, metadata: VideoFrameCallbackMetadata): void => {
      if (presentedFrame(table, metadata.mediaTime) !== wanted) {
        video.requestVideoFrameCallback(hear);
        return;
      }
      clearTimeout(late);
      resolve({
        presented: performance.now() - start,
        ready: metadata.presentationTime - start,
      });
    };
    video.requestVideoFrameCallback(hear);
    video.currentTime = middleOfFrame(table, wanted as FrameIndex) / 1000;
  });

const oursShows = async (wanted: number, intent: FrameIntent): Promise<Shown | null> => {
  if (!source) throw new Error('Open a clip first.');
  const start = performance.now();
  await painter.show(await source.frame(wanted as FrameIndex, { intent }));
  const ready = performance.now() - start;
  await nextBeat();
  const presented = performance.now() - start;
  return numberShown() === wanted ? { presented, ready } : null;
};

/** Requests come at any moment of the screen's rhythm, as a key press does. */
const anyMoment = (k: number): Promise<void> =>
  new Promise((resolve) => setTimeout(resolve, (k * 7) % 17));

const timeEach = async (
  frames: readonly number[],
  show: (wanted: number) => Promise<Shown | null>,
): Promise<Timings> => {
  const timings: Timings = { presented: [], ready: [], wrong: 0 };
  for (const [k, wanted] of frames.entries()) {
    await anyMoment(k);
    const shown = await show(wanted);
    if (!shown) timings.wrong += 1;
    else {
      timings.presented.push(shown.presented);
      timings.ready.push(shown.ready);
    }
  }
  return timings;
};

const bench = {
  /** Opens the copy both ways and waits until all its bytes are here. */
  async open(clip: BenchClip, cacheBytes: number | null): Promise<string> {
    source?.close();
    table = frameTimes(clip);
    const options = cacheBytes === null ? {} : { cacheBytes };
    source = await openClip({ ...clip, frameTable: table }, options);
    await loaded(source);
    if (!video.src.endsWith(clip.url)) {
      video.src = clip.url;
      await new Promise((resolve) => {
        video.addEventListener('canplaythrough', resolve, { once: true });
      });
    }
    return source.kind;
  },

  /** Shows a frame and waits until those after it are held. */
  async settle(first: number, count: number): Promise<void> {
    await oursShows(first, 'step');
    const held = (): boolean => {
      for (let k = first; k < first + count; k += 1)
        if (!source?.holds(k as FrameIndex)) return false;
      return true;
    };
    while (!held()) await nextBeat();
  },

  ours: (frames: readonly number[], intent: FrameIntent): Promise<Timings> =>
    timeEach(frames, (wanted) => oursShows(wanted, intent)),

  browser: (frames: readonly number[]): Promise<Timings> => timeEach(frames, browserShows),
};

export type VideoBench = typeof bench;
declare global {
  interface Window {
    bench: VideoBench;
  }
}
window.bench = bench;

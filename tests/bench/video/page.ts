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

/** Ours and the browser's own video on the same copy, in the same run. */
export interface SideBySide {
  readonly ours: Timings;
  readonly browser: Timings;
}

const LATE_MS = 5000;
const canvas = document.querySelector('canvas') ?? document.createElement('canvas');
const painter = createCanvasPainter(canvas);
const video = document.createElement('video');
video.muted = true;
video.preload = 'auto';
document.body.append(video);
for (const element of [canvas, video]) element.style.cssText = 'display: none; width: 1920px';
document.body.style.margin = '0';

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

/**
 * Composing what was shown goes on after it was presented, without a graphics card for longer than
 * the next request takes: requests on each other's heels would time that. A person's come later.
 */
const REST_MS = 120;

/** Requests come at any moment of the screen's rhythm, as a key press does, to a screen at rest. */
const anyMoment = (k: number): Promise<void> =>
  new Promise((resolve) => setTimeout(resolve, REST_MS + ((k * 7) % 17)));

const nothingYet = (): Timings => ({ presented: [], ready: [], wrong: 0 });

const note = (timings: Timings, shown: Shown | null): void => {
  if (!shown) timings.wrong += 1;
  else {
    timings.presented.push(shown.presented);
    timings.ready.push(shown.ready);
  }
};

/** Requests in a row on one side; short turns, so that other work on the machine slows both. */
const TURN = 10;
/** The browser's video goes on decoding for a while after a seek, ours after a step. */
const SETTLE_MS = 300;

/**
 * One side's turn. Only what is measured is on the screen, at its full size: it has to be
 * composed, and the other need not.
 */
const turn = async (
  element: HTMLElement,
  frames: readonly number[],
  timings: Timings,
  show: (wanted: number) => Promise<Shown | null>,
): Promise<void> => {
  for (const other of [canvas, video]) other.style.display = other === element ? 'block' : 'none';
  await new Promise((resolve) => setTimeout(resolve, SETTLE_MS));
  for (const [k, wanted] of frames.entries()) {
    await anyMoment(k);
    note(timings, await show(wanted));
  }
};

/** Frames after `from` that are held before steps are measured. */
const HELD_AHEAD = 40;

const prefetched = async (from: number): Promise<void> => {
  await oursShows(from, 'step');
  const last = Math.min(from + HELD_AHEAD, table.length - 1);
  while (!source?.holds(last as FrameIndex)) await nextBeat();
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

  /** The same frames by either way, in turns. */
  async inTurns(frames: readonly number[], intent: FrameIntent): Promise<SideBySide> {
    const ours = nothingYet();
    const browser = nothingYet();
    for (let k = 0; k < frames.length; k += TURN) {
      const some = frames.slice(k, k + TURN);
      if (intent === 'step') await prefetched((some[0] ?? 1) - 1);
      await turn(canvas, some, ours, (wanted) => oursShows(wanted, intent));
      await turn(video, some, browser, browserShows);
    }
    return { ours, browser };
  },
};

export type VideoBench = typeof bench;
declare global {
  interface Window {
    bench: VideoBench;
  }
}
window.bench = bench;

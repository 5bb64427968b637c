import { createCanvasPainter } from '#src/video/canvas-painter.ts';
import { DecodedSource } from '#src/video/decoded-source.ts';
import { VideoError } from '#src/video/errors.ts';
import { frameTimes, type TickTable } from '#src/video/frame-times.ts';
import { type LocalLook, lookAtFile } from '#src/video/look-at-file.ts';
import { openClip } from '#src/video/open-clip.ts';
import { createScrubScheduler } from '#src/video/scrub-scheduler.ts';
import { playSlowly } from '#src/video/slow-play.ts';
import type { FrameIntent, FrameSource, FrameSourceKind } from '#src/video/types.ts';
import type { FrameIndex } from '#shared/timing/units.ts';
import { numberBox, readNumber } from '../../fixtures/video/number-pattern.ts';
import { frameLedger, swallowChunks } from './decoder-probe.ts';

export interface OpenRequest extends TickTable {
  readonly url: string;
  readonly width: number;
  readonly height: number;
  readonly begin?: FrameSourceKind;
  readonly cacheBytes?: number;
  readonly sheets?: { prefix: string; framesPerSheet: number; columns: number };
}

/** A frame that was asked for, and the number found in the picture (null: none readable). */
export interface Wrong {
  readonly wanted: number;
  readonly read: number | null;
}

const canvas = document.querySelector('canvas') ?? document.createElement('canvas');
const painter = createCanvasPainter(canvas);
let source: FrameSource | null = null;
/** Bytes that had arrived when the first picture was there. */
let bytesAtOpen: number | null = null;

const opened = (): FrameSource => {
  if (!source) throw new Error('Open a clip first.');
  return source;
};

/** The number in the pixels that are on the canvas now. */
const numberShown = (): number | null => {
  const { width, height } = canvas;
  const box = numberBox(width, height);
  const context = canvas.getContext('2d');
  const pixels = context?.getImageData(box.x, box.y, box.width, box.height).data;
  return pixels ? readNumber(pixels, width, height) : null;
};

const coded = (error: unknown): string =>
  error instanceof VideoError ? error.code : String(error);

const harness = {
  async open({ sheets, begin, cacheBytes, ...clip }: OpenRequest): Promise<string> {
    source?.close();
    source = null;
    const { width: tileWidth, height: tileHeight } = clip;
    const layout = sheets && {
      ...sheets,
      tileWidth,
      tileHeight,
      sheetUrl: (n: number) => `${sheets.prefix}${n}.jpg`,
    };
    try {
      source = await openClip(
        { ...clip, frameTable: frameTimes(clip), ...(layout && { sheets: layout }) },
        { ...(begin && { begin }), ...(cacheBytes !== undefined && { cacheBytes }) },
      );
      const stop = source.onProgress(({ loadedBytes }) => (bytesAtOpen = loadedBytes));
      stop();
      return source.kind;
    } catch (error) {
      return coded(error);
    }
  },

  /** Shows the frames one after another and answers those that were not what was asked for. */
  async walk(frames: readonly number[], intent?: FrameIntent): Promise<Wrong[]> {
    const wrong: Wrong[] = [];
    for (const wanted of frames) {
      const request = intent ? { intent } : {};
      await painter.show(await opened().frame(wanted as FrameIndex, request));
      const read = numberShown();
      if (read !== wanted) wrong.push({ wanted, read });
    }
    return wrong;
  },

  async codeOf(frame: number): Promise<string> {
    try {
      await opened().frame(frame as FrameIndex);
      return 'shown';
    } catch (error) {
      return coded(error);
    }
  },

  /** Sweeps over the clip as a pointer does, faster than it decodes. */
  async scrub(frames: readonly number[]): Promise<{ wrong: Wrong[]; shown: number[] }> {
    const wrong: Wrong[] = [];
    const shown: number[] = [];
    const scheduler = createScrubScheduler<number>(
      async (wanted, signal) => {
        const request = { signal, intent: 'scrub' as const };
        await painter.show(await opened().frame(wanted as FrameIndex, request));
        shown.push(wanted);
        const read = numberShown();
        if (read !== wanted) wrong.push({ wanted, read });
      },
      (error) => wrong.push({ wanted: -1, read: error instanceof VideoError ? -2 : -3 }),
    );
    for (const frame of frames) {
      scheduler.want(frame);
      await new Promise((resolve) => setTimeout(resolve, 2));
    }
    await scheduler.idle();
    return { wrong, shown };
  },

  /** Shows frames without waiting for one another; answers what is on the canvas at the end. */
  async race(frames: readonly number[]): Promise<number | null> {
    const pictures = await Promise.all(frames.map((n) => opened().frame(n as FrameIndex)));
    await Promise.all(pictures.map((picture) => painter.show(picture)));
    return numberShown();
  },

  play(from: number, to: number, rate: number): Promise<number[]> {
    const shown: number[] = [];
    const span = { from: from as FrameIndex, to: to as FrameIndex };
    return new Promise((resolve, reject) => {
      playSlowly(
        opened().frameTable,
        { span, from: span.from, rate, loop: false },
        {
          show: async (index, signal) => {
            await painter.show(await opened().frame(index, { signal, intent: 'step' }));
            shown.push(numberShown() ?? -1);
          },
          ended: () => resolve(shown),
          failed: reject,
        },
      );
    });
  },

  async abortsAtOnce(frame: number): Promise<string> {
    const stopper = new AbortController();
    const waiting = opened().frame(frame as FrameIndex, { signal: stopper.signal });
    stopper.abort();
    return waiting.then(
      () => 'shown',
      (error: unknown) => (error instanceof Error ? error.name : 'unknown'),
    );
  },

  async facts() {
    const now = opened();
    const decoded = now instanceof DecodedSource ? now : null;
    const share = await new Promise<number>((resolve) => {
      const stop = now.onProgress((progress) =>
        queueMicrotask(() => (stop(), resolve(progress.share))),
      );
    });
    return {
      share,
      bytesAtOpen,
      paintMethod: decoded?.paintMethod ?? null,
      remakes: decoded?.decoderRemakes ?? null,
    };
  },

  loaded: (): Promise<void> =>
    new Promise((resolve) => {
      opened().onProgress(({ share }) => {
        if (share >= 1) resolve();
      });
    }),

  swallowChunks,

  close(): void {
    source?.close();
    source = null;
  },

  ledger: () => ({ ...frameLedger }),

  async look(url: string, name: string): Promise<LocalLook> {
    const bytes = await (await fetch(url)).blob();
    return lookAtFile(new File([bytes], name));
  },
};

export type Harness = typeof harness;
declare global {
  interface Window {
    harness: Harness;
  }
}
window.harness = harness;

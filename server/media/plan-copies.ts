import {
  allIntraMaxFrames,
  benchLongEdge,
  benchSmallLongEdge,
  benchTargetBytes,
  expectedBytesPerPixel,
  posterLongEdge,
  replayLongEdge,
  stripTileHeight,
  stripTiles,
} from './limits.ts';
import { fitEven } from './picture-filters.ts';
import type { Size } from './types.ts';

/** What will be made of a clip: sizes, distances of key frames, and which frames are shown as pictures. */
export interface CopyPlan {
  readonly bench: Size & { readonly gop: 1 | 5 };
  /** key frames a second apart */
  readonly replay: Size & { readonly gop: number };
  readonly poster: Size & { readonly frame: number };
  readonly strip: { readonly tile: Size; readonly frames: readonly number[] };
}

/** @param perSecond typical frames per second */
export function planCopies(upright: Size, frames: number, perSecond: number): CopyPlan {
  return {
    bench: planBench(upright, frames),
    replay: { ...fitEven(upright, replayLongEdge), gop: Math.max(1, Math.round(perSecond)) },
    ...planPictures(upright, frames),
  };
}

/** Which frames poster and strip show; made again where fewer frames came out than were promised. */
export const planPictures = (
  upright: Size,
  frames: number,
): Pick<CopyPlan, 'poster' | 'strip'> => ({
  poster: { ...fitEven(upright, posterLongEdge), frame: Math.floor(frames / 2) },
  strip: planStrip(upright, frames),
});

function planBench(upright: Size, frames: number): CopyPlan['bench'] {
  const gop = frames <= allIntraMaxFrames ? 1 : 5;
  const large = fitEven(upright, benchLongEdge);
  const bytes = large.width * large.height * frames * expectedBytesPerPixel[gop];
  return { ...(bytes > benchTargetBytes ? fitEven(upright, benchSmallLongEdge) : large), gop };
}

function planStrip(upright: Size, frames: number): CopyPlan['strip'] {
  const count = Math.min(stripTiles, frames);
  const width = (stripTileHeight * upright.width) / upright.height;
  return {
    tile: { width: Math.max(2, Math.round(width / 2) * 2), height: stripTileHeight },
    // the middle of each of `count` equal spans
    frames: Array.from({ length: count }, (_, i) => Math.floor(((i + 0.5) * frames) / count)),
  };
}

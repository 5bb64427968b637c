import { frameAt } from '#shared/timing/timestamps.ts';
import { type FrameIndex, type Milliseconds, milliseconds } from '#shared/timing/units.ts';
import { VideoError } from './errors.ts';
import { endOfFrame, middleOfFrame } from './frame-times.ts';

/**
 * Where to seek on each try, as a share of the frame's time: the middle is right on prepared
 * copies; other places help where the browser rounds, or where seeking to the same time again
 * would present nothing new.
 */
const PLACES = [0.5, 0.4, 0.65, 0.3];

/** How long a picture may take to be presented after a seek. */
const PRESENTED_WITHIN_MS = 1500;
/** `mediaTime` is in seconds and rounded: a frame may seem to begin a little early. */
const ROUNDING_MS = 0.1;

/** Which frame the browser says it presented; null before the first. */
export const presentedFrame = (
  table: readonly Milliseconds[],
  mediaTimeSeconds: number,
): FrameIndex | null => frameAt(table, milliseconds(mediaTimeSeconds * 1000 + ROUNDING_MS));

const seekPlace = (
  table: readonly Milliseconds[],
  index: FrameIndex,
  place: number,
): Milliseconds => {
  const start = table[index] ?? 0;
  const length = endOfFrame(table, index) - start;
  return length > 0 ? milliseconds(start + place * length) : middleOfFrame(table, index);
};

/** The frame's index once presented; null where nothing was presented in time. */
const seekOnce = (
  video: HTMLVideoElement,
  table: readonly Milliseconds[],
  time: Milliseconds,
): Promise<FrameIndex | null> =>
  new Promise((resolve) => {
    const late = setTimeout(() => {
      video.cancelVideoFrameCallback(handle);
      resolve(null);
    }, PRESENTED_WITHIN_MS);
    const handle = video.requestVideoFrameCallback((_, { mediaTime }) => {
      clearTimeout(late);
      resolve(presentedFrame(table, mediaTime));
    });
    video.currentTime = time / 1000;
  });

const seekBlind = (video: HTMLVideoElement, time: Milliseconds): Promise<void> =>
  new Promise((resolve, reject) => {
    const late = setTimeout(() => reject(new VideoError('stalled')), PRESENTED_WITHIN_MS);
    video.addEventListener('seeked', () => (clearTimeout(late), resolve()), { once: true });
    video.currentTime = time / 1000;
  });

/**
 * Seeks a paused video to a frame and makes sure of it by what the browser says it presented.
 * True where that could be told, false where the browser has no way to tell.
 * Rejects with `VideoError` 'inexact' when it kept presenting another frame.
 */
export const seekExactly = async (
  video: HTMLVideoElement,
  table: readonly Milliseconds[],
  index: FrameIndex,
): Promise<boolean> => {
  if (!('requestVideoFrameCallback' in video)) {
    await seekBlind(video, middleOfFrame(table, index));
    return false;
  }
  const shown: (FrameIndex | null)[] = [];
  for (const place of PLACES) {
    const presented = await seekOnce(video, table, seekPlace(table, index, place));
    if (presented === index) return true;
    shown.push(presented);
  }
  throw new VideoError('inexact', `frame ${index}: presented ${shown.join(', ')}`);
};

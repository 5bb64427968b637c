import { abortReason } from '#src/video/errors.ts';
import type { ClipSource } from '#src/video/types.ts';
import { TrackingError } from '../errors.ts';
import type { Tracker } from '../types.ts';
import type { ToWorker } from './messages.ts';
import { codeOf, openFeeder, type PictureFeeder } from './picture-feeder.ts';
import { WorkerLink } from './worker-link.ts';

export interface TrackerClip {
  /** The prepared copy, as the page shows it. */
  readonly clip: ClipSource;
  /** Size of the upright source frame, in whose pixels all points are given. */
  readonly source: { readonly width: number; readonly height: number };
}

export interface OpenTrackerOptions {
  readonly signal?: AbortSignal;
  /** The way to begin with; default: the decoder, then sheets. */
  readonly begin?: Tracker['kind'];
}

const GIVE_WAY_MS = 300;

const makeWorker = (): Worker =>
  new Worker(new URL('./tracking.worker.ts', import.meta.url), { type: 'module' });

/** Sheets may help against these; against the rest they would not. */
const worthFallingBack = (error: unknown): boolean =>
  error instanceof TrackingError && (error.code === 'unsupported' || error.code === 'stalled');

const opening = (
  { clip, source }: TrackerClip,
  decodes: boolean,
): Extract<ToWorker, { do: 'open' }> => ({
  do: 'open',
  clip: decodes
    ? { url: new URL(clip.url, location.href).href, frameTable: clip.frameTable }
    : null,
  frameCount: clip.frameTable.length,
  sourceWidth: source.width,
  sourceHeight: source.height,
});

const trackerOf = (
  link: WorkerLink,
  kind: Tracker['kind'],
  feeder: PictureFeeder | null,
): Tracker => ({
  kind,
  follow: (request, options = {}) => link.follow((n) => ({ do: 'follow', n, request }), options),
  look: (frame, point, signal) => link.look((n) => ({ do: 'look', n, frame, point }), signal),
  giveWay: (ms = GIVE_WAY_MS) => link.post({ do: 'give-way', ms }),
  close() {
    link.end(new TrackingError('closed'));
    feeder?.close();
  },
});

/** Ends the worker where opening fails or is no longer wanted. */
const opened = async (
  link: WorkerLink,
  message: Extract<ToWorker, { do: 'open' }>,
  signal: AbortSignal | undefined,
): Promise<void> => {
  const stop = (): void => link.end(new TrackingError('closed'));
  signal?.addEventListener('abort', stop, { once: true });
  try {
    await link.open(message);
  } catch (error) {
    stop();
    throw signal?.aborted ? abortReason(signal) : error;
  } finally {
    signal?.removeEventListener('abort', stop);
  }
};

const openDecoding = async (clip: TrackerClip, signal?: AbortSignal): Promise<Tracker> => {
  const link = new WorkerLink(makeWorker(), () => undefined);
  await opened(link, opening(clip, true), signal);
  return trackerOf(link, 'decoder', null);
};

const openFed = async (clip: TrackerClip, signal?: AbortSignal): Promise<Tracker> => {
  const feeder = await openFeeder(clip.clip, signal);
  const link: WorkerLink = new WorkerLink(makeWorker(), (frame) => {
    feeder.picture(frame).then(
      (picture) => link.post({ do: 'take', frame, picture }, [picture.luma.buffer]),
      (error: unknown) => link.post({ do: 'do-without', frame, ...codeOf(error) }),
    );
  });
  try {
    await opened(link, opening(clip, false), signal);
  } catch (error) {
    feeder.close();
    throw error;
  }
  return trackerOf(link, 'sheets', feeder);
};

/**
 * A tracker for one clip, in a worker of its own.
 * Rejects with a `TrackingError`, or with the signal's reason.
 */
export const openTracker = async (
  clip: TrackerClip,
  { signal, begin = 'decoder' }: OpenTrackerOptions = {},
): Promise<Tracker> => {
  if (signal?.aborted) throw abortReason(signal);
  if (begin === 'decoder') {
    try {
      return await openDecoding(clip, signal);
    } catch (error) {
      if (!worthFallingBack(error)) throw error;
    }
  }
  return openFed(clip, signal);
};

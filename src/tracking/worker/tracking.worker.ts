import type { FrameIndex } from '#shared/timing/units.ts';
import type { FramePoint } from '#shared/geometry/points.ts';
import { VideoError } from '#src/video/errors.ts';
import { followAll } from '../core/follow-all.ts';
import { lookAtPlace } from '../core/look.ts';
import { requestFault } from '../core/plan.ts';
import { TrackingError } from '../errors.ts';
import type { Followed, FollowRequest } from '../types.ts';
import { Breather } from './breather.ts';
import { DecodedPictures } from './decoded-pictures.ts';
import { FedPictures } from './fed-pictures.ts';
import type { FromWorker, ToWorker } from './messages.ts';
import type { PictureSource } from './picture-source.ts';

/** Nobody waits for the answer any more. */
class Cancelled extends Error {}

/** How often the page hears how it goes, ms. */
const TELL_MS = 80;

const tell = (message: FromWorker): void => postMessage(message);
const breather = new Breather();
const cancelled = new Set<number>();
const looks: { n: number; frame: FrameIndex; point: FramePoint }[] = [];
const follows: { n: number; request: FollowRequest }[] = [];
let source = { width: 0, height: 0 };
let frameCount = 0;
let pictures: PictureSource | null = null;
let fed: FedPictures | null = null;
let running = false;

const tellFailed = (n: number | null, error: unknown): void => {
  if (error instanceof Cancelled) return;
  const coded = error instanceof VideoError || error instanceof TrackingError;
  const code = coded ? error.code : 'crashed';
  tell({ say: 'failed', n, code, detail: coded ? error.detail : String(error) });
};

const opened = (): PictureSource => {
  if (!pictures) throw new TrackingError('closed');
  return pictures;
};

const lookNow = async ({ n, frame, point }: (typeof looks)[number]): Promise<void> => {
  if (cancelled.delete(n)) return;
  try {
    if (!(frame >= 0 && frame < frameCount)) throw new TrackingError('no-such-frame');
    const picture = await opened().picture(frame, null);
    tell({ say: 'looked', n, touch: lookAtPlace(picture, point, source) });
  } catch (error) {
    tellFailed(n, error);
  }
};

const looksFirst = async (): Promise<void> => {
  for (let look = looks.shift(); look; look = looks.shift()) await lookNow(look);
};

const followNow = async ({ n, request }: (typeof follows)[number]): Promise<void> => {
  const fault = requestFault(request, frameCount);
  if (fault) throw new TrackingError('bad-request', fault);
  const found = new Map<string, Followed[]>();
  let toldAt = 0;
  let toldHeld = false;
  const report = (done: number, total: number): void => {
    const { held } = breather;
    if (performance.now() - toldAt < TELL_MS && held === toldHeld && done < total) return;
    toldAt = performance.now();
    toldHeld = held;
    for (const [id, places] of found) tell({ say: 'places', n, id, places });
    found.clear();
    tell({ say: 'progress', n, progress: { done, total, held } });
  };
  const result = await followAll(request, {
    source,
    picture: (frame, next) => opened().picture(frame, next),
    places: (id, places) => found.set(id, [...(found.get(id) ?? []), ...places]),
    breathe: (done, total) =>
      breather.breathe(async () => {
        if (cancelled.has(n)) throw new Cancelled();
        await looksFirst();
        report(done, total);
      }),
  });
  tell({ say: 'followed', n, result });
};

const run = async (): Promise<void> => {
  if (running) return;
  running = true;
  for (;;) {
    await looksFirst();
    const follow = follows.shift();
    if (!follow) break;
    await followNow(follow).catch((error: unknown) => tellFailed(follow.n, error));
    cancelled.delete(follow.n);
  }
  running = false;
};

const open = async (message: Extract<ToWorker, { do: 'open' }>): Promise<void> => {
  source = { width: message.sourceWidth, height: message.sourceHeight };
  frameCount = message.frameCount;
  if (message.clip) pictures = await DecodedPictures.open(message.clip);
  else pictures = fed = new FedPictures((frame) => tell({ say: 'need', frame }));
  // proves that this browser can decode it
  if (message.clip) await pictures.picture(0 as FrameIndex, null);
  tell({ say: 'opened' });
};

addEventListener('message', ({ data }: MessageEvent<ToWorker>) => {
  if (data.do === 'open') open(data).catch((error: unknown) => tellFailed(null, error));
  else if (data.do === 'follow') follows.push(data);
  else if (data.do === 'look') looks.push(data);
  else if (data.do === 'cancel') cancelled.add(data.n);
  else if (data.do === 'give-way') breather.giveWay(data.ms);
  else if (data.do === 'take') fed?.take(data.frame, data.picture);
  else fed?.doWithout(data.frame, data.code, data.detail);
  if (data.do === 'follow' || data.do === 'look') void run();
});

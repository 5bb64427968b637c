import {
  BlobSource,
  EncodedPacketSink,
  Input,
  type InputVideoTrack,
  MP4,
  QTFF,
  QuickTimeInputFormat,
  WEBM,
  WebMInputFormat,
} from 'mediabunny';
import { type Seconds, seconds } from '#shared/timing/units.ts';
import { abortReason } from './errors.ts';
import { frameRateOf, type MeasuredRate } from './frame-rate-of.ts';

/** What the file itself says, before a byte of it is sent. */
export interface LookedAtClip {
  readonly outcome: 'clip';
  readonly container: 'mp4' | 'mov' | 'webm';
  /** Short name ('avc', 'hevc', 'vp9', …), null where the codec is unknown. */
  readonly codec: string | null;
  /** Pixels as displayed: after rotation and pixel aspect. */
  readonly width: number;
  readonly height: number;
  /** Clockwise, degrees, as the phone asks for; `width` and `height` already include it. */
  readonly rotation: 0 | 90 | 180 | 270;
  readonly length: Seconds;
  /** Null where fewer than two frames leave it unknown. */
  readonly frameRate: MeasuredRate | null;
  /** Null where counting would mean reading the whole file. */
  readonly frames: number | null;
  readonly hdr: boolean;
  /** Whether this browser can decode it; where not, the server can still prepare it. */
  readonly decodableHere: boolean;
  /** The index promises more than the file holds: it was cut while copying. */
  readonly cutShort: boolean;
}

export type UnusableFile = 'empty' | 'no-picture' | 'no-index' | 'not-a-video';

export interface LookedAtOther {
  readonly outcome: UnusableFile;
  /** One sentence that says what to do. */
  readonly advice: string;
}

export type LocalLook = LookedAtClip | LookedAtOther;

const ADVICE = {
  empty: 'The file is empty. Copy it from the phone again.',
  'no-picture': 'The file holds sound but no picture. Choose the video itself.',
  'no-index':
    'The file is incomplete: its index is missing, so the recording or the copying was cut off. Copy it from the phone again.',
  'not-a-video': 'This is not a video that can be read here. Choose an MP4, MOV or WebM file.',
} as const satisfies Record<UnusableFile, string>;

const unusable = (outcome: UnusableFile): LookedAtOther => ({ outcome, advice: ADVICE[outcome] });

/**
 * At most so many frames are counted: 10 minutes at 240 a second from an MP4's index, which takes
 * no reading; WebM has no such index, so there a thousand are enough for the rate.
 */
const COUNTED = { indexed: 144_000, scattered: 1_000 };

const timesOf = async (
  sink: EncodedPacketSink,
  limit: number,
): Promise<{ times: Seconds[]; all: boolean }> => {
  const times: Seconds[] = [];
  for await (const packet of sink.packets(undefined, undefined, { metadataOnly: true })) {
    if (times.length === limit) return { times, all: false };
    times.push(seconds(packet.timestamp));
  }
  return { times, all: true };
};

/** The last packet in the index lies behind the end of a file that was cut. */
const endIsMissing = async (sink: EncodedPacketSink): Promise<boolean> => {
  const last = await sink.getPacket(Infinity, { metadataOnly: true });
  if (!last) return true;
  const read = await sink.getPacket(last.timestamp).catch(() => null);
  return read?.sequenceNumber !== last.sequenceNumber || read.data.length < last.byteLength;
};

const lookAtTrack = async (input: Input, track: InputVideoTrack): Promise<LookedAtClip> => {
  const format = await input.getFormat();
  const webm = format instanceof WebMInputFormat;
  const sink = new EncodedPacketSink(track);
  const { times, all } = await timesOf(sink, webm ? COUNTED.scattered : COUNTED.indexed);
  const length = (await track.getDurationFromMetadata()) ?? (await track.computeDuration());
  return {
    outcome: 'clip',
    container: webm ? 'webm' : format instanceof QuickTimeInputFormat ? 'mov' : 'mp4',
    codec: await track.getCodec(),
    width: await track.getDisplayWidth(),
    height: await track.getDisplayHeight(),
    rotation: await track.getRotation(),
    length: seconds(length),
    frameRate: frameRateOf(times),
    frames: all ? times.length : null,
    hdr: await track.hasHighDynamicRange(),
    decodableHere: await track.canDecode(),
    cutShort: !webm && (await endIsMissing(sink)),
  };
};

/**
 * An instant look at a file on this device, from its container alone; nothing is decoded.
 * Never rejects because of the file: what cannot be used has an outcome of its own. Rejects with
 * the signal's reason when aborted.
 */
export const lookAtFile = async (file: Blob, signal?: AbortSignal): Promise<LocalLook> => {
  if (signal?.aborted) throw abortReason(signal);
  if (file.size === 0) return unusable('empty');
  const input = new Input({ formats: [MP4, QTFF, WEBM], source: new BlobSource(file) });
  const stop = (): void => input.dispose();
  signal?.addEventListener('abort', stop, { once: true });
  try {
    if (!(await input.canRead())) return unusable('not-a-video');
    const tracks = await input.getTracks();
    if (tracks.length === 0) return unusable('no-index');
    const track = await input.getPrimaryVideoTrack();
    return track ? await lookAtTrack(input, track) : unusable('no-picture');
  } catch {
    if (signal?.aborted) throw abortReason(signal);
    return unusable('no-index');
  } finally {
    signal?.removeEventListener('abort', stop);
    input.dispose();
  }
};

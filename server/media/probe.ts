import { seconds } from '#shared/timing/units.ts';
import { type CheckedFile, checkFile } from './check-file.ts';
import { type PacketScan, packetsOf, scanFile, tableOf } from './frame-table.ts';
import { maxFrames } from './limits.ts';
import { measureRate, typicalRate } from './measure-rate.ts';
import { headerOf, type KnownPicture, type ReadHeader, readHeader } from './read-header.ts';
import { MediaRefusal } from './refusals.ts';
import type { ClipFacts, FrameTable } from './types.ts';

/** A clip whose numbers are known, and what its checks need. */
export interface ProbedClip {
  readonly file: CheckedFile;
  readonly picture: KnownPicture;
  readonly facts: ClipFacts;
  /** of the original, on its own clock */
  readonly frames: FrameTable;
  /** what the header promises, seconds; null where it promises nothing */
  readonly declaredSeconds: number | null;
  /** where its packets end, by the same count as `declaredSeconds` */
  readonly haveSeconds: number;
  /** packets that are decoded but never shown */
  readonly discarded: number;
}

export interface ProbeOptions {
  readonly originalName?: string;
  readonly signal?: AbortSignal;
}

/**
 * Measures a file without decoding it. Nothing is guessed: what stays unknown is a refusal.
 * @throws MediaRefusal, MediaFailure
 */
export async function probe(path: string, options: ProbeOptions = {}): Promise<ProbedClip> {
  const file = await checkFile(path, options.originalName);
  const scan = await scanFile(file.path, file.demuxer, options.signal);
  const read = scan.endless
    ? await readHeader(file, options.signal)
    : headerOf(scan.header, file.cut);
  return assemble(file, read, packetsOf(scan, read.picture.index, read.header.timeBases));
}

/**
 * The shown frames of a file that ffmpeg can read, from its packets: discarded ones dropped, sorted.
 * @throws MediaRefusal, MediaFailure
 */
export async function frameTable(path: string, options: ProbeOptions = {}): Promise<FrameTable> {
  return (await probe(path, options)).frames;
}

function assemble(
  file: CheckedFile,
  { header, picture }: ReadHeader,
  packets: PacketScan,
): ProbedClip {
  const { ticks } = packets;
  const [first, last] = [ticks[0], ticks.at(-1)];
  if (packets.endless) throw tooLong(null, header.declaredSeconds ?? 0, maxFrames / fastest);
  if (packets.untimed > 0) throw new MediaRefusal('no-timestamps', {});
  if (first === undefined || last === undefined) throw noFrames(file.cut);
  if (ticks.length === 1)
    throw file.cut ? new MediaRefusal('only-header', {}) : new MediaRefusal('one-frame', {});
  if (ticks.some((tick, i) => tick === ticks[i - 1])) throw new MediaRefusal('no-timestamps', {});
  const { timeBase } = picture;
  const inSeconds = (tick: number) => (tick * timeBase.num) / timeBase.den;
  // where the last frame's length is not written it lasts as long as the one before
  const lasts = packets.lastDuration ?? last - (ticks.at(-2) ?? first);
  const duration = inSeconds(last + lasts - first);
  // a matroska file promises one length for all its streams, the others one for the picture
  const shared = file.demuxer === 'matroska';
  return {
    file,
    picture,
    frames: tableOf(ticks, timeBase),
    declaredSeconds: shared ? header.declaredSeconds : picture.declaredSeconds,
    haveSeconds: shared ? (packets.endSeconds ?? duration) : duration,
    discarded: packets.discarded,
    facts: {
      container: file.container,
      bytes: file.bytes,
      codec: picture.codec,
      pixelFormat: picture.pixelFormat,
      coded: picture.coded,
      upright: picture.upright,
      rotation: picture.rotation,
      pixelAspect: picture.pixelAspect,
      dynamicRange: picture.dynamicRange,
      frameRate: measureRate(ticks, timeBase),
      frameCount: ticks.length,
      duration: seconds(duration),
      startOffset: { ticks: first, timeBase },
      attachedPictures: header.attachedPictures,
      hasSound: header.hasSound,
    },
  };
}

/** Frames per second; what a clip that was not measured may at least hold. */
const fastest = 240;

const noFrames = (cut: boolean) =>
  cut
    ? new MediaRefusal('only-header', {})
    : new MediaRefusal('damaged', { fromSeconds: 0, lostFrames: null, haveSeconds: 0 });

const tooLong = (frames: number | null, length: number, maxSeconds: number) =>
  new MediaRefusal('too-long', { frames, maxFrames, seconds: length, maxSeconds });

/** @throws MediaRefusal too-long where more frames are wanted than are prepared */
export function checkLength(frames: number, facts: ClipFacts): void {
  if (frames <= maxFrames) return;
  throw tooLong(facts.frameCount, facts.duration, maxFrames / typicalRate(facts.frameRate));
}

import { maxScannedFrames } from './limits.ts';
import { fileArgs } from './ffprobe-args.ts';
import { microseconds } from './rational.ts';
import { runFfprobe } from './run-ffprobe.ts';
import type { Demuxer } from './sniff.ts';
import type { FrameTable, Rational } from './types.ts';

/** What the packets of a file say, without decoding. */
export interface PacketScan {
  /** instants of the shown frames, ascending, in ticks of the picture stream */
  readonly ticks: readonly number[];
  /** ticks that the last shown frame lasts; null where the file does not say */
  readonly lastDuration: number | null;
  /** packets of the picture without any time */
  readonly untimed: number;
  /** packets of the picture that are decoded but never shown */
  readonly discarded: number;
  /** end of the last packet of any stream, seconds; null where unknown */
  readonly endSeconds: number | null;
  /** the scan was given up: more pictures than any clip has */
  readonly endless: boolean;
}

interface ShownPacket {
  readonly pts: number;
  readonly duration: number | null;
}

/** The packets of one stream; of sound only where they end. */
interface StreamPackets {
  readonly shown: ShownPacket[];
  untimed: number;
  discarded: number;
  /** ticks; null where no packet has a time */
  end: number | null;
}

/** A file read once through. */
export interface FileScan {
  readonly streams: ReadonlyMap<number, StreamPackets>;
  /** ffprobe's JSON without the packets; half a document where the file was given up as endless */
  readonly header: string;
  /** more pictures than any clip has */
  readonly endless: boolean;
}

export async function scanFile(
  path: string,
  demuxer: Demuxer,
  signal?: AbortSignal,
): Promise<FileScan> {
  const streams = new Map<number, StreamPackets>();
  const header: string[] = [];
  let endless = false;
  const onLine = (line: string): void | false => {
    if (header.length > 0 || HEADER.test(line)) return void header.push(line);
    const packet = parsePacket(line);
    if (!packet) return;
    const known = streams.get(packet.stream);
    const stream = known ?? { shown: [], untimed: 0, discarded: 0, end: null };
    if (!known) streams.set(packet.stream, stream);
    count(packet, stream);
    endless = stream.shown.length + stream.untimed > maxScannedFrames;
    return endless ? false : undefined;
  };
  await runFfprobe(fileArgs(path, demuxer), onLine, signal);
  return { streams, header: `{${header.join('\n')}`, endless };
}

function count({ pts, duration, discarded, picture }: Packet, stream: StreamPackets): void {
  if (pts !== null) stream.end = Math.max(stream.end ?? -Infinity, pts + (duration ?? 0));
  if (!picture) return;
  if (discarded) stream.discarded += 1;
  else if (pts === null) stream.untimed += 1;
  else stream.shown.push({ pts, duration });
}

/**
 * What the packets say of the picture stream `pictureIndex`.
 * @param timeBases seconds per tick of each stream, by stream index
 */
export function packetsOf(
  { streams, endless }: FileScan,
  pictureIndex: number,
  timeBases: ReadonlyMap<number, Rational>,
): PacketScan {
  const picture = streams.get(pictureIndex);
  const shown = [...(picture?.shown ?? [])].sort((a, b) => a.pts - b.pts);
  const ends = [...streams].flatMap(([index, { end }]) => {
    const timeBase = timeBases.get(index);
    return end === null || !timeBase ? [] : [(end * timeBase.num) / timeBase.den];
  });
  return {
    ticks: shown.map((packet) => packet.pts),
    lastDuration: shown.at(-1)?.duration ?? null,
    untimed: picture?.untimed ?? 0,
    discarded: picture?.discarded ?? 0,
    endSeconds: ends.length > 0 ? Math.max(...ends) : null,
    endless,
  };
}

interface Packet {
  readonly stream: number;
  readonly picture: boolean;
  readonly pts: number | null;
  readonly duration: number | null;
  /** outside the file's own edit list: decoded, never shown */
  readonly discarded: boolean;
}

/** Where the packets, and what lies between them, are over. */
const HEADER = /^ {4}"streams": \[$/;
const PACKET =
  /^\s*\{ "codec_type": "(\w+)", "stream_index": (\d+),(?: "pts": (-?\d+),)?(?: "duration": (\d+),)? "flags": "([^"]*)"(?: \},?|,)$/;

/** A line of `fileArgs` that begins a packet; null for any other. */
export function parsePacket(line: string): Packet | null {
  const [, type, stream, pts, duration, flags] = PACKET.exec(line) ?? [];
  if (stream === undefined) return null;
  const lasts = whole(duration);
  return {
    stream: Number(stream),
    picture: type === 'video',
    pts: whole(pts),
    duration: lasts !== null && lasts > 0 ? lasts : null,
    discarded: flags?.includes('D') ?? false,
  };
}

const whole = (text: string | undefined): number | null =>
  text !== undefined && Number.isSafeInteger(Number(text)) ? Number(text) : null;

export const tableOf = (ticks: readonly number[], timeBase: Rational): FrameTable => ({
  timeBase,
  ticks,
  us: ticks.map((tick) => microseconds(tick, timeBase)),
});

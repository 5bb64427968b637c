import { maxScannedFrames } from './limits.ts';
import { packetArgs } from './ffprobe-args.ts';
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
  /** the scan was given up: more packets than any clip has */
  readonly endless: boolean;
}

interface ScannedPacket {
  readonly pts: number;
  readonly duration: number | null;
}

/** @param timeBases seconds per tick of each stream, by stream index */
export async function scanPackets(
  path: string,
  demuxer: Demuxer,
  pictureIndex: number,
  timeBases: ReadonlyMap<number, Rational>,
  signal?: AbortSignal,
): Promise<PacketScan> {
  const shown: ScannedPacket[] = [];
  let untimed = 0;
  let discarded = 0;
  let endSeconds: number | null = null;
  let endless = false;
  const onLine = (line: string): void | false => {
    const packet = parsePacket(line);
    if (!packet) return;
    const timeBase = timeBases.get(packet.stream);
    if (packet.pts !== null && timeBase) {
      const end = ((packet.pts + (packet.duration ?? 0)) * timeBase.num) / timeBase.den;
      endSeconds = Math.max(endSeconds ?? end, end);
    }
    if (packet.stream !== pictureIndex) return;
    if (packet.discarded) discarded += 1;
    else if (packet.pts === null) untimed += 1;
    else shown.push({ pts: packet.pts, duration: packet.duration });
    endless = shown.length + untimed > maxScannedFrames;
    return endless ? false : undefined;
  };
  await runFfprobe(packetArgs(path, demuxer), onLine, signal);
  shown.sort((a, b) => a.pts - b.pts);
  return {
    ticks: shown.map((packet) => packet.pts),
    lastDuration: shown.at(-1)?.duration ?? null,
    untimed,
    discarded,
    endSeconds,
    endless,
  };
}

interface Packet {
  readonly stream: number;
  readonly pts: number | null;
  readonly duration: number | null;
  /** outside the file's own edit list: decoded, never shown */
  readonly discarded: boolean;
}

/** One line of `packetArgs`: '0,1536,512,K_'. Null for anything else. */
export function parsePacket(line: string): Packet | null {
  const [stream, pts, duration, flags] = line.split(',');
  if (stream === undefined || pts === undefined || flags === undefined) return null;
  const known = (text: string | undefined) =>
    text !== undefined && /^-?\d+$/.test(text) && Number.isSafeInteger(Number(text))
      ? Number(text)
      : null;
  const index = known(stream);
  if (index === null) return null;
  const lasts = known(duration);
  return {
    stream: index,
    pts: known(pts),
    duration: lasts !== null && lasts > 0 ? lasts : null,
    discarded: flags.includes('D'),
  };
}

export const tableOf = (ticks: readonly number[], timeBase: Rational): FrameTable => ({
  timeBase,
  ticks,
  us: ticks.map((tick) => microseconds(tick, timeBase)),
});

import { timestampFault } from '#shared/timing/timestamps.ts';
import { type FrameIndex, type Milliseconds, milliseconds } from '#shared/timing/units.ts';
import { VideoError } from './errors.ts';

/**
 * How far a packet's time may lie from the table's and still be the same frame. Half the shortest
 * interval of 240 frames a second is 2 ms; containers round to 1 ms at worst.
 */
const SAME_FRAME_MS = 1;

/** Times as the server stores them: frame n is shown at `ticks[n] × num / den` seconds. */
export interface TickTable {
  readonly timeBase: { readonly num: number; readonly den: number };
  readonly ticks: readonly number[];
}

export const frameTimes = ({ timeBase, ticks }: TickTable): Milliseconds[] =>
  ticks.map((tick) => milliseconds((tick * timeBase.num * 1000) / timeBase.den));

/** Throws `mismatch` unless the table has frames and rises strictly. */
export const checkFrameTable = (table: readonly Milliseconds[]): void => {
  const fault = timestampFault(table);
  if (fault) throw new VideoError('mismatch', `${fault.code} at frame ${fault.at}`);
  if (table.length === 0) throw new VideoError('mismatch', 'the table of frame times is empty');
};

/**
 * Throws `mismatch` unless packet k of the copy, in presentation order, is frame k of the table.
 * Both begin at their own first frame: only the distances count.
 */
export const checkPacketsAgainstTable = (
  packets: readonly Milliseconds[],
  table: readonly Milliseconds[],
): void => {
  if (packets.length !== table.length)
    throw new VideoError('mismatch', `${packets.length} packets, ${table.length} frame times`);
  const shift = (packets[0] ?? 0) - (table[0] ?? 0);
  for (const [k, time] of packets.entries()) {
    const off = Math.abs(time - shift - (table[k] ?? NaN));
    if (!(off <= SAME_FRAME_MS))
      throw new VideoError('mismatch', `frame ${k} is ${off.toFixed(3)} ms off its time`);
  }
};

/** Until when a frame is shown; the last one lasts as long as the one before it (else 0). */
export const endOfFrame = (table: readonly Milliseconds[], index: FrameIndex): Milliseconds => {
  const next = table[index + 1];
  if (next !== undefined) return next;
  const start = table[index] ?? 0;
  return milliseconds(start + (start - (table[index - 1] ?? start)));
};

/**
 * The middle of a frame's time: where a browser's own video is asked to seek, since at the exact
 * start rounding shows the frame before (12 to 20 of 60 tries, measured).
 */
export const middleOfFrame = (table: readonly Milliseconds[], index: FrameIndex): Milliseconds =>
  milliseconds(((table[index] ?? 0) + endOfFrame(table, index)) / 2);

/** Throws `no-such-frame` unless the index lies within the table. */
export const checkIndex = (table: readonly Milliseconds[], index: FrameIndex): void => {
  if (!Number.isInteger(index) || index < 0 || index >= table.length)
    throw new VideoError('no-such-frame', `frame ${index} of ${table.length}`);
};

import type { FramePoint } from '#shared/geometry/points.ts';
import { type Milliseconds, toSeconds } from '#shared/timing/units.ts';

/** A span of a clip. Its end is exclusive, as the standard has it; null is the end of the clip. */
export interface ClipSpan {
  readonly from: Milliseconds;
  readonly to: Milliseconds | null;
}

/**
 * Frames first to last, both inclusive, as a span: it ends where the frame after the last begins.
 * @param times of every frame of the clip
 * @returns null where the clip has no such frames
 */
export const spanOfFrames = (
  times: readonly Milliseconds[],
  first: number,
  last: number,
): ClipSpan | null => {
  const from = times[first];
  if (from === undefined || times[last] === undefined || last < first) return null;
  return { from, to: times[last + 1] ?? null };
};

/** Microseconds tell the frames of every clip apart. */
const seconds = (time: Milliseconds): string => String(Number(toSeconds(time).toFixed(6)));

/** `t=3,7`, or `t=3` up to the end: normal play time, W3C Media Fragments URI 1.0, 4.2.1. */
export const timeFragment = ({ from, to }: ClipSpan): string =>
  to === null ? `t=${seconds(from)}` : `t=${seconds(from)},${seconds(to)}`;

/** A corner of something drawn, pixels of the source. */
export interface Corner {
  readonly u: number;
  readonly v: number;
}

const pixels = (from: Corner, to: Corner): string => {
  const left = Math.max(0, Math.floor(from.u));
  const top = Math.max(0, Math.floor(from.v));
  const width = Math.max(1, Math.ceil(to.u) - left);
  const height = Math.max(1, Math.ceil(to.v) - top);
  return `xywh=${left},${top},${width},${height}`;
};

/** The whole pixels that hold all these corners. */
export const boxFragment = (points: readonly Corner[]): string => {
  const us = points.map(({ u }) => u);
  const vs = points.map(({ v }) => v);
  return pixels(
    { u: Math.min(...us), v: Math.min(...vs) },
    { u: Math.max(...us), v: Math.max(...vs) },
  );
};

/**
 * `xywh=160,120,320,240`: the whole pixels that hold a circle, 4.2.2. Pixels left of or above the
 * picture do not exist.
 */
export const regionFragment = ({ u, v }: FramePoint, radius: number): string =>
  pixels({ u: u - radius, v: v - radius }, { u: u + radius, v: v + radius });

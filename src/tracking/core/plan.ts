import { type FrameIndex, frameIndex } from '#shared/timing/units.ts';
import type { FollowRequest, PointToFollow } from '../types.ts';

/** What is wrong with a request, in words for a log; null where it can be followed. */
export const requestFault = (
  { points, from, to }: FollowRequest,
  frameCount: number,
): string | null => {
  const within = (frame: number): boolean =>
    Number.isInteger(frame) && frame >= 0 && frame < frameCount;
  if (!within(from) || !within(to) || from > to) return `no span ${from} to ${to}`;
  const ids = new Set(points.map(({ id }) => id));
  if (ids.size !== points.length) return 'two points of one name';
  for (const { id, keyframes } of points) {
    const frames = new Set(keyframes.map(({ frame }) => frame));
    if (frames.size === 0) return `${id} has no keyframe`;
    if (frames.size !== keyframes.length) return `${id} has two keyframes on one frame`;
    for (const { frame, point } of keyframes)
      if (!within(frame) || !Number.isFinite(point.u) || !Number.isFinite(point.v))
        return `${id} has no place on frame ${frame}`;
  }
  return null;
};

/** Pictures to look at one after another, both ends inclusive; the second may be the smaller. */
export interface Way {
  readonly first: FrameIndex;
  readonly last: FrameIndex;
}

const sorted = ({ keyframes }: PointToFollow): FrameIndex[] =>
  keyframes.map(({ frame }) => frame).sort((a, b) => a - b);

/**
 * Forwards: from the last keyframe before the span, or the first within it, to the end of the span.
 * Null where no point has one.
 */
export const wayForward = ({ points, from, to }: FollowRequest): Way | null => {
  const firsts = points.flatMap((point) => {
    const frames = sorted(point);
    const before = frames.filter((frame) => frame <= from).at(-1);
    const first = before ?? frames.find((frame) => frame <= to);
    return first === undefined ? [] : [first];
  });
  return firsts.length === 0 ? null : { first: frameIndex(Math.min(...firsts)), last: to };
};

/** Backwards: from the first keyframe after the span, or the last within it, to its beginning. */
export const wayBack = ({ points, from, to }: FollowRequest): Way | null => {
  const firsts = points.flatMap((point) => {
    const frames = sorted(point);
    const after = frames.find((frame) => frame >= to);
    const first = after ?? frames.filter((frame) => frame >= from).at(-1);
    return first === undefined ? [] : [first];
  });
  return firsts.length === 0 ? null : { first: frameIndex(Math.max(...firsts)), last: from };
};

/** The keyframes on both sides of a frame, itself excluded; null where there is none. */
export const neighbours = (
  frames: readonly FrameIndex[],
  frame: number,
): { readonly before: FrameIndex | null; readonly after: FrameIndex | null } => {
  let before: FrameIndex | null = null;
  let after: FrameIndex | null = null;
  for (const key of frames) {
    if (key < frame && (before === null || key > before)) before = key;
    if (key > frame && (after === null || key < after)) after = key;
  }
  return { before, after };
};

import type { DemoRep, DemoTruth } from './truth.ts';

/** `count` of them, evenly spread, first and last included. */
const evenly = (frames: readonly number[], count: number): number[] =>
  frames.length <= count
    ? [...frames]
    : Array.from({ length: count }, (_, i) =>
        Math.round((i * (frames.length - 1)) / (count - 1)),
      ).flatMap((at) => frames[at] ?? []);

const span = (first: number, last: number): number[] =>
  Array.from({ length: Math.max(0, last - first + 1) }, (_, i) => first + i);

/**
 * The frames that a careful coach marks of a rep: quiet stance, the way up with more around 60° and 90°, the top,
 * and a few on the way down.
 */
export const framesToMark = ({ frames }: DemoTruth, rep: DemoRep): number[] => {
  const rise = span(rep.footOffFrame, rep.plateauEndFrame);
  const between = (low: number, high: number): number[] =>
    rise.filter((frame) => {
      const lift = frames.values.lift[frame] ?? NaN;
      return lift >= low && lift < high;
    });
  const chosen = [
    ...evenly(span(...rep.quietFrames), 6),
    ...evenly(between(20, 52), 5),
    ...evenly(between(52, 68), 7),
    ...evenly(between(68, 82), 3),
    ...evenly(between(82, 98), 7),
    ...evenly(between(rep.maxLift - 4, 180), 4),
    ...evenly(span(rep.plateauEndFrame + 4, rep.footDownFrame), 3),
  ];
  return [...new Set(chosen)].sort((a, b) => a - b);
};

import type { FrameIndex } from '#shared/timing/units.ts';
import type { CourseFrame } from './types.ts';

/**
 * Frames of a rep whose marks carry the reading, of all those that a tracker has filled: what a careful
 * coach would mark by hand. More of them would not say more: a tracker's errors hang together from
 * frame to frame, and frames taken as independent that are not make a reading surer than it is.
 */

/** How many frames of which lift, degrees, on the way up. From our model, no source. */
const RISE: readonly { readonly from: number; readonly to: number; readonly count: number }[] = [
  { from: 20, to: 52, count: 5 },
  { from: 52, to: 67, count: 7 },
  { from: 67, to: 83, count: 3 },
  { from: 83, to: 97, count: 7 },
];
const QUIET = 6;
const SHIFT = 2;
const TOP = 4;
/** Degrees under the highest lift that still are the top. */
const TOP_WITHIN = 4;
const LOWERING = 3;
/** Without a lift to go by, this many over the whole rep. */
const EVENLY = 36;

const spread = <T>(from: readonly T[], count: number): readonly T[] =>
  from.length <= count
    ? from
    : Array.from(
        { length: count },
        (_, i) => from[Math.round((i * (from.length - 1)) / Math.max(1, count - 1))],
      ).filter((each): each is T => each !== undefined);

/** The two frames on each side of a change of phase: they say when the foot leaves or lands. */
const around = (frames: readonly CourseFrame[], at: number): readonly CourseFrame[] =>
  at < 1 ? [] : frames.slice(Math.max(0, at - 2), at + 2);

/**
 * @param frames of a dense course, in order of time
 * @param doubtful frames that are taken only where no other will do
 */
export const worthKeeping = (
  frames: readonly CourseFrame[],
  doubtful: ReadonlySet<FrameIndex> = new Set(),
): readonly FrameIndex[] => {
  const pick = (from: readonly CourseFrame[], count: number): readonly CourseFrame[] => {
    const clear = from.filter(({ frame }) => !doubtful.has(frame));
    return spread(clear.length >= count ? clear : from, count);
  };
  const quiet = frames.filter(({ phase }) => phase === 'quiet');
  const rise = frames.filter(({ phase }) => phase === 'rise');
  const firstUp = frames.findIndex(({ phase }) => phase === 'rise');
  const lowering = frames.filter(({ phase }) => phase === 'lower');
  const landed = lowering.length === 0 ? -1 : frames.findLastIndex((f) => f.phase === 'lower') + 1;
  const highest = Math.max(...rise.map(({ lift }) => lift ?? -Infinity));
  if (quiet.length === 0 || rise.length === 0 || !Number.isFinite(highest))
    return pick(frames, EVENLY).map(({ frame }) => frame);
  const lifted = (from: number, to: number): readonly CourseFrame[] =>
    rise.filter(({ lift }) => lift !== null && lift >= from && lift < to);
  const quietEnd = frames.findLastIndex(({ phase }) => phase === 'quiet');
  const chosen = [
    ...pick(quiet, QUIET),
    ...pick(frames.slice(quietEnd + 1, firstUp), SHIFT),
    ...around(frames, firstUp),
    ...RISE.flatMap(({ from, to, count }) => pick(lifted(from, to), count)),
    ...pick(lifted(highest - TOP_WITHIN, Infinity), TOP),
    ...pick(lowering, LOWERING),
    ...around(frames, landed),
  ];
  return [...new Set(chosen.map(({ frame }) => frame))].sort((a, b) => a - b);
};

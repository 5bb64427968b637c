import type { CourseFrame } from '#shared/course/types.ts';
import type { ReadingRules } from '#shared/protocol/protocol.ts';
import { leastFrames } from '#shared/reading/usable.ts';
import type { FrameIndex, Milliseconds } from '#shared/timing/units.ts';
import { frameAtLift, type HillPoint } from './hill.ts';
import { degrees } from '#shared/geometry/units.ts';

/** A frame worth marking before there is a reading, and why. */
export interface Suggestion {
  readonly frame: FrameIndex;
  readonly why: 'quiet' | 'look-for-rise' | 'near-from' | 'near-to' | 'between';
}

/** Quiet frames recommended; three are the least. */
const QUIET = 5;
/** Standing still at the beginning of a rep: spread over its first second, ms. */
const QUIET_SPAN_MS = 1000;

const frameFrom = (
  times: readonly Milliseconds[],
  time: number,
  [from, to]: readonly [FrameIndex, FrameIndex],
): FrameIndex => {
  let best = from;
  for (let frame = from; frame <= to; frame = (frame + 1) as FrameIndex)
    if (Math.abs((times[frame] ?? 0) - time) < Math.abs((times[best] ?? 0) - time)) best = frame;
  return best;
};

type Near = 'near-from' | 'near-to' | 'between';
const liftsOf = ({
  gateFrom,
  gateTo,
}: ReadingRules): Readonly<Record<Near, readonly number[]>> => ({
  'near-from': [-3, 1, 4, -5].map((by) => gateFrom + by),
  'near-to': [-1, -4, 2, 5].map((by) => gateTo + by),
  between: [(gateFrom + gateTo) / 2 - 3, gateFrom - 20, gateTo - 10],
});

/**
 * What to mark before the reading can say it itself: five quiet frames, then the rise looked
 * through in halves until its lift is known, then near either gate, the top and between. `span`
 * is the rep, both ends inclusive. Null once the least is there.
 */
export const firstFrame = (
  span: readonly [FrameIndex, FrameIndex],
  times: readonly Milliseconds[],
  frames: readonly CourseFrame[],
  hill: readonly HillPoint[],
  rules: ReadingRules,
): Suggestion | null => {
  const [from, to] = span;
  const start = times[from] ?? 0;
  const end = times[to] ?? start;
  const marked = new Set(frames.map((each) => each.frame));
  const early = frames.filter(
    (each) => each.phase === 'quiet' || each.time <= start + QUIET_SPAN_MS,
  );
  if (early.length < QUIET) {
    const step = Math.min(QUIET_SPAN_MS, (end - start) / 4) / (QUIET - 1);
    for (let n = 0; n < QUIET; n += 1) {
      const frame = frameFrom(times, start + n * step, span);
      const taken = early.some((each) => Math.abs(each.time - (times[frame] ?? 0)) < step / 2);
      if (!taken && !marked.has(frame)) return { frame, why: 'quiet' };
    }
  }
  const lifted = hill.filter((point) => point.lift >= 25);
  if (lifted.length < 3) {
    const probe = widestGap(frames, span, times, start + QUIET_SPAN_MS);
    return probe === null ? null : { frame: probe, why: 'look-for-rise' };
  }
  const wanting = leastFrames(rules).find(
    (least) =>
      frames.filter(
        ({ phase, lift }) =>
          phase === 'rise' &&
          lift !== null &&
          lift >= least.from &&
          (least.to === null || lift <= least.to),
      ).length < least.need,
  );
  if (!wanting) return null;
  const kinds: readonly Near[] =
    wanting.code === 'few-near-60'
      ? ['near-from']
      : wanting.code === 'few-near-90'
        ? ['near-to']
        : ['between', 'near-from', 'near-to'];
  const lifts = liftsOf(rules);
  for (const kind of kinds) {
    for (const lift of lifts[kind]) {
      const frame = frameAtLift(hill, degrees(lift), times);
      if (frame !== null && !marked.has(frame)) return { frame, why: kind };
    }
  }
  // every such frame is taken: the hill itself must first become finer
  const probe = widestGap(frames, span, times, start + QUIET_SPAN_MS);
  return probe === null ? null : { frame: probe, why: 'between' };
};

/** The middle of the longest stretch without a mark, after a time. */
const widestGap = (
  frames: readonly CourseFrame[],
  span: readonly [FrameIndex, FrameIndex],
  times: readonly Milliseconds[],
  after: number,
): FrameIndex | null => {
  const [from, to] = span;
  const begin = frameFrom(times, after, span);
  const ends = [
    begin,
    ...frames.map((each) => each.frame).filter((frame) => frame > begin && frame < to),
    to,
  ];
  let best: { readonly frame: FrameIndex; readonly gap: number } | null = null;
  for (const [n, right] of ends.entries()) {
    const left = ends[n - 1];
    if (left === undefined) continue;
    const gap = right - left;
    if (gap >= 2 && (!best || gap > best.gap))
      best = { frame: Math.round((left + right) / 2) as FrameIndex, gap };
  }
  return best && best.frame > from ? best.frame : null;
};

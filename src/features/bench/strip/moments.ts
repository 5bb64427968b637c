import type { RepPhases } from '#shared/course/types.ts';
import type { Rep } from '#shared/contracts/reps.ts';
import { MOMENT_ORDER, MOMENTS, type Moment } from '#shared/records/engine-input.ts';
import { frameIndex, type FrameIndex, type Milliseconds } from '#shared/timing/units.ts';

/** A moment of the rep on the strip: found from the marks, or moved by hand. */
export interface PlacedMoment {
  readonly moment: Moment;
  readonly frame: FrameIndex;
  readonly byHand: boolean;
}

export const MOMENT_WORDS: Readonly<Record<Moment, string>> = {
  quietStart: 'quiet',
  quietEnd: 'quiet ends',
  footOff: 'foot off',
  top: 'top',
  topEnd: 'lower',
  footDown: 'foot down',
};
/** Whose word stands where not all have room, the weightiest first. */
export const MOMENT_WEIGHT: readonly Moment[] = [
  'footOff',
  'top',
  'quietStart',
  'footDown',
  'topEnd',
  'quietEnd',
];
export const MOMENT_NAMES: Readonly<Record<Moment, string>> = {
  quietStart: 'First quiet frame',
  quietEnd: 'Last quiet frame',
  footOff: 'Foot off, the rise begins',
  top: 'Top of the lift',
  topEnd: 'End of the top, lowering begins',
  footDown: 'Foot down',
};

const nearestFrame = (
  time: Milliseconds,
  { startFrame, endFrame }: Rep,
  times: readonly Milliseconds[],
): FrameIndex => {
  let best = startFrame;
  for (let frame = startFrame; frame <= endFrame; frame += 1)
    if (Math.abs((times[frame] ?? 0) - time) < Math.abs((times[best] ?? 0) - time)) best = frame;
  return frameIndex(best);
};

/** Every moment there is evidence for, in order. */
export const momentsOf = (
  rep: Rep,
  phases: RepPhases | null,
  times: readonly Milliseconds[],
): PlacedMoment[] =>
  MOMENT_ORDER.flatMap((moment): readonly PlacedMoment[] => {
    const hand = rep.boundaries[moment];
    if (hand?.by === 'hand') return [{ moment, frame: frameIndex(hand.frame), byHand: true }];
    const time = phases?.boundaries[MOMENTS[moment]] ?? null;
    return time === null ? [] : [{ moment, frame: nearestFrame(time, rep, times), byHand: false }];
  });

/** How far a moment may be moved: its neighbours and the rep hold it, all inclusive. */
export const roomOf = (
  moments: readonly PlacedMoment[],
  moment: Moment,
  rep: Pick<Rep, 'startFrame' | 'endFrame'>,
): { readonly from: number; readonly to: number } => {
  const at = MOMENT_ORDER.indexOf(moment);
  const before = moments.filter((each) => MOMENT_ORDER.indexOf(each.moment) < at);
  const after = moments.filter((each) => MOMENT_ORDER.indexOf(each.moment) > at);
  return {
    from: Math.max(rep.startFrame, ...before.map((each) => each.frame)),
    to: Math.min(rep.endFrame, ...after.map((each) => each.frame)),
  };
};

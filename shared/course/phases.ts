import type { Degrees } from '#shared/geometry/units.ts';
import type { LevelFrame } from '#shared/measures/level.ts';
import { liftOf } from '#shared/measures/lift.ts';
import type { Setting } from '#shared/measures/measure.ts';
import type { Rig } from '#shared/measures/rig.ts';
import type { TiedLift } from '#shared/measures/tied-lift.ts';
import { settingOf } from '#shared/measures/setting.ts';
import type { LandmarkSetId } from '#shared/landmarks/types.ts';
import type { Milliseconds } from '#shared/timing/units.ts';
import { medianOfThree } from './robust.ts';
import { findRise } from './rise.ts';
import { findStance } from './stance.ts';
import type { BoundaryId, FramePhase, RepBoundaries, RepPhases } from './types.ts';

/** A rep divided into its parts, with the setting its quiet stance gives. */
export interface Divided {
  readonly phases: RepPhases;
  readonly setting: Setting;
  readonly lifts: readonly (Degrees | null)[];
}

export interface Dividing {
  readonly frames: readonly LevelFrame[];
  readonly shared: readonly LevelFrame[] | null;
  readonly moved: Partial<RepBoundaries>;
  readonly labels: readonly FramePhase[] | null;
  readonly liftFrom?: TiedLift | undefined;
}

const IDS: readonly BoundaryId[] = [
  'quietFrom',
  'quietTo',
  'footOff',
  'top',
  'lowerFrom',
  'footDown',
];

const liftsOf = (frames: readonly LevelFrame[], setting: Setting): readonly (Degrees | null)[] =>
  frames.map((frame) => {
    const lift = liftOf(frame, setting);
    return typeof lift === 'number' ? lift : null;
  });

/** Phases known from elsewhere: nothing is searched and no frame is rejected. */
const labelled = (
  frames: readonly LevelFrame[],
  labels: readonly FramePhase[],
  liftFrom: TiedLift | undefined,
  rig: Rig,
  set: LandmarkSetId,
): Divided => {
  const byFrame = frames.map((_, i) => labels[i] ?? 'between');
  const quiet = frames.filter((_, i) => byFrame[i] === 'quiet');
  const setting = settingOf(rig, quiet, set, liftFrom);
  const lifts = liftsOf(frames, setting);
  const rising = medianOfThree(lifts.map((lift, i) => (byFrame[i] === 'rise' ? lift : null)));
  const top = rising.indexOf(Math.max(...rising.map((lift) => lift ?? -Infinity)));
  const time = (frame: LevelFrame | undefined): Milliseconds | null => frame?.time ?? null;
  return {
    setting,
    lifts,
    phases: {
      boundaries: {
        quietFrom: time(quiet[0]),
        quietTo: time(quiet.at(-1)),
        footOff: null,
        top: top < 0 ? null : time(frames[top]),
        lowerFrom: time(frames[byFrame.lastIndexOf('rise')]),
        footDown: null,
      },
      moved: [],
      footOffHalfGap: null,
      byFrame,
    },
  };
};

/**
 * Divides a rep into quiet stance, rise and lowering. What the coach moved by hand stands; the rest
 * is found from the marks.
 */
export const divide = (
  { frames, shared, moved, labels, liftFrom }: Dividing,
  rig: Rig,
  set: LandmarkSetId,
): Divided => {
  if (labels) return labelled(frames, labels, liftFrom, rig, set);
  const stance = findStance(frames, shared, rig, moved);
  const setting = settingOf(rig, stance.quiet, set, liftFrom);
  const lifts = liftsOf(frames, setting);
  const times = frames.map((frame) => frame.time);
  const rise = findRise(times, lifts, stance, moved);
  const quiet = new Set(shared ? [] : stance.quiet);
  return {
    setting,
    lifts,
    phases: {
      boundaries: {
        quietFrom: moved.quietFrom ?? stance.quiet[0]?.time ?? null,
        quietTo: moved.quietTo ?? stance.quiet.at(-1)?.time ?? null,
        footOff: stance.footOff,
        top: rise.top,
        lowerFrom: rise.lowerFrom,
        footDown: rise.footDown,
      },
      moved: IDS.filter((id) => moved[id] !== undefined),
      footOffHalfGap: stance.footOffHalfGap,
      byFrame: frames.map((frame, i) =>
        quiet.has(frame) ? 'quiet' : (rise.byFrame[i] ?? 'between'),
      ),
    },
  };
};

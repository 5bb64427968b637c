import { withMarkError } from '#shared/measures/tied-lift.ts';
import { type Degrees, degrees } from '#shared/geometry/units.ts';
import type { LandmarkSetId } from '#shared/landmarks/types.ts';
import { landmarksOf } from '#shared/landmarks/table.ts';
import { CONSTANTS } from '#shared/measures/constants.ts';
import type { MarkError } from '#shared/measures/inputs.ts';
import { type LevelFrame, levelFrame } from '#shared/measures/level.ts';
import { liftHalfWidth, liftOf } from '#shared/measures/lift.ts';
import type { Setting } from '#shared/measures/measure.ts';
import type { Missing } from '#shared/measures/missing.ts';
import { restsOnHollow } from '#shared/measures/need.ts';
import { isRig, rigOf } from '#shared/measures/rig.ts';
import { isTurn, turnHalfWidth, turnOf } from '#shared/measures/turn.ts';
import { frameWeight } from '#shared/measures/turn-parts.ts';
import { divide } from './phases.ts';
import type { CourseFrame, FramePhase, RepInput, RepPhases } from './types.ts';

/** A rep's course with one landmark set: what is shown and what the fit is made of. */
export interface RepCourse {
  readonly rep: RepInput;
  readonly set: LandmarkSetId;
  readonly setting: Setting;
  readonly level: readonly LevelFrame[];
  readonly phases: RepPhases;
  readonly frames: readonly CourseFrame[];
  /** Mean of the two largest lifts of the rise; of the only one where there is one. */
  readonly fMax: Degrees | null;
}

const courseFrame = (
  frame: LevelFrame,
  phase: FramePhase,
  setting: Setting,
  withHalfWidths: boolean,
): CourseFrame => {
  const lift = liftOf(frame, setting);
  const turn = turnOf(frame, setting);
  const height = typeof lift === 'number' ? lift : null;
  const known = isTurn(turn) ? turn : null;
  const weight =
    height === null || known === null
      ? null
      : height < CONSTANTS.leastLift.value
        ? 0
        : frameWeight(known.variance);
  return {
    frame: frame.frame,
    time: frame.time,
    phase,
    lift: height,
    liftHalfWidth: height === null || !withHalfWidths ? null : liftHalfWidth(frame, setting),
    turn: known?.turn ?? null,
    turnHalfWidth: known && turnHalfWidth(known.variance + known.zeroVariance, setting),
    femurYaw: known?.femurYaw ?? null,
    pelvisYaw: known?.pelvisYaw ?? null,
    thighPart: known?.thighPart ?? null,
    pelvisPart: known?.pelvisPart ?? null,
    weight,
    inFit: phase === 'rise' && weight !== null && weight > 0,
    missing: {
      lift: typeof lift === 'number' ? null : lift,
      turn: isTurn(turn) ? null : turn,
    },
    provisional: restsOnHollow(frame, landmarksOf(setting.set)),
  };
};

/** Mean of the two largest lifts of the rise, as the rule takes it. */
export const highestLift = (frames: readonly CourseFrame[]): Degrees | null => {
  const [first, second] = frames
    .flatMap((frame) => (frame.phase === 'rise' && frame.lift !== null ? [frame.lift] : []))
    .sort((a, b) => b - a);
  if (first === undefined) return null;
  return degrees((first + (second ?? first)) / 2);
};

/**
 * The course of one rep, frame by frame. A quick call: no Monte Carlo, except 200 draws a frame for
 * the ± of lift, which `halfWidths: false` leaves out. Missing scale or distance: nothing can be
 * computed.
 */
export const courseOfRep = (
  rep: RepInput,
  set: LandmarkSetId,
  error: MarkError,
  { halfWidths = true }: { readonly halfWidths?: boolean } = {},
): RepCourse | Missing => {
  const rig = rigOf(rep.camera, rep.athlete, rep.supportSide);
  if (!isRig(rig)) return rig;
  const level = rep.frames.map((frame) => levelFrame(frame, rep.camera, error));
  const shared = rep.sharedQuiet?.map((frame) => levelFrame(frame, rep.camera, error)) ?? null;
  const { phases, setting } = divide(
    {
      frames: level,
      shared,
      moved: rep.moved,
      labels: rep.labels,
      liftFrom: rep.liftFrom && withMarkError(rep.liftFrom, error),
    },
    rig,
    set,
  );
  const frames = level.map((frame, i) =>
    courseFrame(frame, phases.byFrame[i] ?? 'between', setting, halfWidths),
  );
  return { rep, set, setting, level, phases, frames, fMax: highestLift(frames) };
};

export const isCourse = (course: RepCourse | Missing): course is RepCourse => 'phases' in course;

import type { LandmarkSetId } from '#shared/landmarks/types.ts';
import type { LevelFrame } from './level.ts';
import type { Setting } from './measure.ts';
import { referenceOf } from './reference.ts';
import type { Rig } from './rig.ts';
import type { TiedLift } from './tied-lift.ts';
import { turnZeroOf } from './turn-zero.ts';

/** Everything measures of one rep share, from its quiet frames. */
export const settingOf = (
  rig: Rig,
  quiet: readonly LevelFrame[],
  set: LandmarkSetId,
  tiedLift?: TiedLift,
): Setting => {
  const reference = referenceOf(quiet, rig);
  return { rig, reference, set, turnZero: turnZeroOf({ rig, reference, set }), tiedLift };
};

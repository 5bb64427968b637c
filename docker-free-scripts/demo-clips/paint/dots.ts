import { PART } from '../figure/paints.ts';
import { type Camera } from '../model/camera.ts';
import { type LandmarkId, landmarksOf, type Pointers } from '../model/landmarks.ts';
import type { Skeleton } from '../model/skeleton.ts';
import type { Vec } from '../model/vec.ts';

/** A round sticker: everything of its part within `radius` of the line from the lens through `at`. */
export interface Dot {
  readonly at: Vec;
  readonly radius: number;
  readonly parts: readonly number[];
}

const STICKER = 13;
const TIP = 8.5;

/** Stickers on the landmarks the lens can see, in the room. */
export const dotsOf = (
  bones: Skeleton,
  camera: Camera,
  pointers: Pointers,
  place: (point: Vec) => Vec,
): readonly Dot[] => {
  const side = camera.plan.facing !== 0;
  const at = landmarksOf(bones, pointers);
  const dot = (id: LandmarkId, parts: readonly number[], radius = STICKER): readonly Dot[] => {
    const point = at.get(id);
    return point === undefined ? [] : [{ at: place(point), radius, parts }];
  };
  const trunk = [PART.trunk, PART.kit];
  if (side)
    return [
      ...dot('trochanter', [PART.trunk, PART.liftedLeg]),
      ...dot('knee-lateral', [PART.liftedLeg]),
      ...dot('ankle-lifted', [PART.liftedLeg]),
      ...dot('acromion', [PART.trunk, PART.liftedArm]),
    ];
  return [
    ...dot('asis-support', trunk),
    ...dot('asis-lifted', trunk),
    ...dot('kneecap', [PART.supportLeg]),
    ...dot('lifted-knee', [PART.liftedLeg]),
    ...dot('ankle-support', [PART.supportLeg]),
    ...dot('ankle-lifted', [PART.liftedLeg]),
    ...dot('acromion-support', [PART.trunk, PART.supportArm]),
    ...dot('acromion-lifted', [PART.trunk, PART.liftedArm]),
    ...dot('belt-tip', [PART.kit], TIP),
    ...dot('thigh-tip', [PART.kit], TIP),
  ];
};

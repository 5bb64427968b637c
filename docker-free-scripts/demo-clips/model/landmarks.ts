import { HIP_INWARD, OUTLINE_BEHIND, STRAP_ABOVE_KNEE, STRAP_SKIN } from './bodies.ts';
import type { Leg, Skeleton } from './skeleton.ts';
import { along, type Vec } from './vec.ts';

/** Pointer lengths as a coach measures them, mm; null where the person wears none. */
export interface Pointers {
  /** ASIS line to the tip */
  readonly belt: number | null;
  /** skin to the tip */
  readonly thigh: number | null;
}

export const FRONT_LANDMARKS = [
  'asis-support',
  'asis-lifted',
  'outline-support',
  'outline-lifted',
  'lifted-knee',
  'ankle-support',
  'ankle-lifted',
  'kneecap',
  'knee-inner',
  'knee-outer',
  'belt-tip',
  'thigh-tip',
  'strap-inner',
  'strap-outer',
  'acromion-support',
  'acromion-lifted',
  'toe-support',
  'heel-support',
] as const;

/** Of the side seen, the lifted one; and the far ankle, which the near one covers in quiet stance. */
export const SIDE_LANDMARKS = [
  'ankle-support',
  'ankle-lifted',
  'trochanter',
  'knee-lateral',
  'acromion',
] as const;

export type LandmarkId = (typeof FRONT_LANDMARKS)[number] | (typeof SIDE_LANDMARKS)[number];

/** Half the strap's visible width on the thigh: a little more than the knee's. */
export const strapHalf = (kneeWidth: number): number => 0.56 * kneeWidth;

/** Where the strap's middle sits on a thigh's axis. */
export const strapMiddle = (leg: Leg): Vec => along(leg.knee, leg.thigh, [0, 0, STRAP_ABOVE_KNEE]);

export const thighTip = (leg: Leg, skinToTip: number): Vec =>
  along(strapMiddle(leg), leg.thigh, [STRAP_SKIN + skinToTip, 0, 0]);

export const beltTip = (bones: Skeleton, lineToTip: number): Vec =>
  along(bones.asisMiddle, bones.pelvis, [lineToTip, 0, 0]);

/** Places of all landmarks in the person's coordinates, mm. What is not worn has no place. */
export const landmarksOf = (bones: Skeleton, worn: Pointers): ReadonlyMap<LandmarkId, Vec> => {
  const { body, support, lifted, pelvis, trunk } = bones;
  const halfAsis = body.asisWidth / 2;
  const halfKnee = body.kneeWidth / 2;
  const halfStrap = strapHalf(body.kneeWidth);
  const asis = (sign: number): Vec => along(bones.asisMiddle, pelvis, [0, sign * halfAsis, 0]);
  const outline = (sign: number): Vec =>
    along(bones.asisMiddle, pelvis, [-OUTLINE_BEHIND, sign * body.pelvisHalfWidth, 0]);
  const acromion = (sign: number): Vec =>
    along(bones.acromionMiddle, trunk, [0, (sign * body.acromionWidth) / 2, 0]);
  const trochanterOut = body.pelvisHalfWidth + 14 - (0.5 - HIP_INWARD) * body.asisWidth;
  const strap = strapMiddle(support);
  const foot = (ahead: number): Vec =>
    along(support.ankle, support.foot, [ahead, 0, 22 - body.ankleHeight]);

  const places = new Map<LandmarkId, Vec>([
    ['asis-support', asis(support.sign)],
    ['asis-lifted', asis(lifted.sign)],
    ['outline-support', outline(support.sign)],
    ['outline-lifted', outline(lifted.sign)],
    ['lifted-knee', lifted.knee],
    ['ankle-support', support.ankle],
    ['ankle-lifted', lifted.ankle],
    ['kneecap', along(support.knee, support.thigh, [halfKnee, 0, 0])],
    ['knee-inner', along(support.knee, support.thigh, [0, -support.sign * halfKnee, 0])],
    ['knee-outer', along(support.knee, support.thigh, [0, support.sign * halfKnee, 0])],
    ['acromion-support', acromion(support.sign)],
    ['acromion-lifted', acromion(lifted.sign)],
    ['toe-support', foot(body.ankleToToe)],
    ['heel-support', foot(-body.ankleToHeel)],
    ['trochanter', along(lifted.hip, lifted.thigh, [0, lifted.sign * trochanterOut, 0])],
    ['knee-lateral', along(lifted.knee, lifted.thigh, [0, lifted.sign * halfKnee, 0])],
    ['acromion', acromion(lifted.sign)],
  ]);
  if (worn.belt !== null) places.set('belt-tip', beltTip(bones, worn.belt));
  if (worn.thigh !== null) {
    places.set('thigh-tip', thighTip(support, worn.thigh));
    places.set('strap-inner', along(strap, support.thigh, [0, -support.sign * halfStrap, 0]));
    places.set('strap-outer', along(strap, support.thigh, [0, support.sign * halfStrap, 0]));
  }
  return places;
};

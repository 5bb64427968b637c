import { away, reach, type Spot } from './reach.ts';

/** Lengths of a grown body, units; from us, no source. */
export const BODY = {
  trunk: 50,
  neck: 24,
  thigh: 43,
  shank: 42,
  upperArm: 29,
  forearm: 28,
  /** Of an ankle above the sole. */
  ankle: 8,
} as const;

export interface LegPose {
  readonly ankle: Spot;
  /** How far the toes point down, degrees: 0 flat, 90 straight down, 170 lying backwards. */
  readonly foot?: number;
}

export interface ArmPose {
  readonly hand: Spot;
  /** Where the elbow points. */
  readonly elbow?: 'back' | 'front';
}

/**
 * A person seen from the side. The near leg is the support leg, drawn as the right one; for the left the drawing is
 * mirrored.
 */
export interface Pose {
  readonly hip: Spot;
  /** How far the trunk leans forward from upright, degrees; -90 lies on the back. */
  readonly trunk: number;
  readonly near: LegPose;
  readonly far: LegPose;
  readonly nearArm: ArmPose;
  readonly farArm: ArmPose;
}

export interface LimbJoints {
  readonly root: Spot;
  readonly joint: Spot;
  readonly end: Spot;
}

export interface Joints {
  readonly hip: Spot;
  readonly shoulder: Spot;
  readonly head: Spot;
  /** Direction of the face, radians. */
  readonly facing: number;
  readonly near: LimbJoints & { readonly foot: number };
  readonly far: LimbJoints & { readonly foot: number };
  readonly nearArm: LimbJoints;
  readonly farArm: LimbJoints;
}

export const radians = (degrees: number): number => (degrees * Math.PI) / 180;

const leg = (root: Spot, { ankle, foot = 0 }: LegPose) => {
  // a knee bends forward
  const [joint, end] = reach(root, ankle, [BODY.thigh, BODY.shank], 1);
  return { root, joint, end, foot: -radians(foot) };
};

const arm = (root: Spot, { hand, elbow = 'back' }: ArmPose): LimbJoints => {
  const bend = elbow === 'back' ? -1 : 1;
  const [joint, end] = reach(root, hand, [BODY.upperArm, BODY.forearm], bend);
  return { root, joint, end };
};

/** Every joint of a pose: bones keep their lengths, whatever is reached for. */
export const jointsOf = ({ hip, trunk, near, far, nearArm, farArm }: Pose): Joints => {
  const up = radians(90 - trunk);
  const shoulder = away(hip, up, BODY.trunk);
  return {
    hip,
    shoulder,
    head: away(shoulder, up, BODY.neck),
    facing: up - Math.PI / 2,
    near: leg(hip, near),
    far: leg(hip, far),
    nearArm: arm(shoulder, nearArm),
    farArm: arm(shoulder, farArm),
  };
};

import type { Skeleton } from './skeleton.ts';
import { dot, RAD, sub, type Vec } from './vec.ts';

/** True angles of one posture, degrees, signs as in the measurement's conventions. */
export interface Angles {
  readonly lift: number;
  readonly turn: number;
  readonly yawFemur: number;
  readonly yawPelvis: number;
  readonly obliquity: number;
  readonly pelvisTilt: number;
  readonly trunkLean: number;
  readonly footTurnOut: number;
  readonly liftToPelvis: number;
}

const azimuth = (direction: Vec): number => Math.atan2(direction[1], direction[0]) / RAD;

/** Read off the posed bones, not off the script, so that the truth is what the picture shows. */
export const anglesOf = (bones: Skeleton): Angles => {
  const { support, lifted, pelvis } = bones;
  const sigma = support.sign;
  const thigh = sub(lifted.knee, lifted.hip);
  const spine = sub(bones.acromionMiddle, bones.hipMiddle);
  const yawFemur = azimuth(support.thigh.forward);
  const yawPelvis = azimuth(pelvis.forward);
  return {
    lift: Math.atan2(thigh[0], -thigh[2]) / RAD,
    turn: sigma * (yawFemur - yawPelvis),
    yawFemur,
    yawPelvis,
    obliquity: (-sigma * Math.atan2(pelvis.left[2], pelvis.left[1])) / RAD,
    pelvisTilt: Math.asin(pelvis.forward[2]) / RAD,
    trunkLean: (sigma * Math.atan2(spine[1], spine[2])) / RAD,
    footTurnOut: sigma * azimuth(support.foot.forward),
    liftToPelvis: Math.atan2(dot(thigh, pelvis.forward), -dot(thigh, pelvis.up)) / RAD,
  };
};

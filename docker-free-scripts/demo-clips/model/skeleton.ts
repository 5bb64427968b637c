import { type Body, HIP_BEHIND, HIP_BELOW, HIP_INWARD } from './bodies.ts';
import { sideSign, type Stance } from './stance.ts';
import {
  add,
  along,
  type Axes,
  axesAlongBone,
  axesFromAngles,
  cross,
  dot,
  ease,
  length,
  mix,
  RAD,
  scale,
  sub,
  unit,
  type Vec,
} from './vec.ts';

export interface Leg {
  /** +1 on the athlete's left, −1 on the right */
  readonly sign: 1 | -1;
  readonly hip: Vec;
  readonly knee: Vec;
  readonly ankle: Vec;
  readonly thigh: Axes;
  readonly shank: Axes;
  /** forward along the sole, left across it, up away from it */
  readonly foot: Axes;
}

export interface Skeleton {
  readonly body: Body;
  readonly support: Leg;
  readonly lifted: Leg;
  readonly pelvis: Axes;
  /** middle of the ASIS line */
  readonly asisMiddle: Vec;
  readonly hipMiddle: Vec;
  readonly trunk: Axes;
  readonly acromionMiddle: Vec;
}

/** Sideways way of the pelvis over the support leg, a share of the distance of the ASIS. */
const SHIFT_SHARE = 0.24;
/** Lift from which the raised leg no longer remembers where its foot stood, degrees. */
const FREE_LIFT = 16;

const down = (up: Vec): Vec => scale(up, -1);

/** Straight or slightly bent leg from hip to ankle; a leg too short takes its heel off the floor. */
const standingKnee = (body: Body, hip: Vec, wanted: Vec): { knee: Vec; ankle: Vec } => {
  const reach = sub(wanted, hip);
  const distance = length(reach);
  const straight = body.thigh + body.shank;
  const towards = unit(reach);
  if (distance >= straight * 0.99998)
    return {
      knee: add(hip, scale(towards, body.thigh)),
      ankle: add(hip, scale(towards, straight)),
    };
  const toFoot = (body.thigh ** 2 - body.shank ** 2 + distance ** 2) / (2 * distance);
  const bend = Math.sqrt(Math.max(0, body.thigh ** 2 - toFoot ** 2));
  const front = unit([
    1 - towards[0] * towards[0],
    -towards[0] * towards[1],
    -towards[0] * towards[2],
  ]);
  return { knee: add(add(hip, scale(towards, toFoot)), scale(front, bend)), ankle: wanted };
};

/** How far the shank of a raised leg hangs back from the vertical, degrees. */
const hangBack = (lift: number): number => 13 * ease(lift / 40) - 6 * ease((lift - 40) / 60);

const liftedLeg = (body: Body, stance: Stance, hip: Vec, sign: 1 | -1): Leg => {
  const standing = standingKnee(body, hip, [0, sign * body.stanceHalfWidth, body.ankleHeight]);
  const free = ease(stance.lift / FREE_LIFT);
  const azimuth = 0.55 * stance.pelvisYaw * RAD;
  const [sin, cos] = [Math.sin(stance.lift * RAD), Math.cos(stance.lift * RAD)];
  const raised: Vec = [sin * Math.cos(azimuth), sin * Math.sin(azimuth) - sign * 0.04, -cos];
  const back = hangBack(stance.lift) * RAD;
  const hanging: Vec = [-Math.sin(back), -sign * 0.035, -Math.cos(back)];
  const thighDown = unit(mix(unit(sub(standing.knee, hip)), raised, free));
  const shankDown = unit(mix(unit(sub(standing.ankle, standing.knee)), hanging, free));
  const knee = add(hip, scale(thighDown, body.thigh));
  const ankle = add(knee, scale(shankDown, body.shank));
  const yaw = sign * stance.footTurnOut;
  const shank = axesAlongBone(down(shankDown), (0.6 * azimuth) / RAD + sign * 3);
  const heelUp = Math.max(0, ankle[2] - body.ankleHeight);
  const onToes = Math.asin(Math.min(0.6, heelUp / (body.ankleToToe * 0.8))) / RAD;
  const relaxed = 8 + 0.9 * hangBack(stance.lift);
  const pitch = -((1 - free) * Math.min(onToes, 14) + free * relaxed);
  return {
    sign,
    hip,
    knee,
    ankle,
    thigh: raisedThighAxes(thighDown, azimuth / RAD + sign * 1.5 * (1 - free)),
    shank,
    foot: axesFromAngles(yaw * (1 - 0.4 * free), pitch, 0),
  };
};

/** A level thigh has no azimuth of its own front, so its axes are built on the knee's hinge. */
const raisedThighAxes = (thighDown: Vec, yaw: number): Axes => {
  const hinge: Vec = [-Math.sin(yaw * RAD), Math.cos(yaw * RAD), 0];
  const up = down(thighDown);
  const left = unit(sub(hinge, scale(up, dot(hinge, up))));
  return { forward: cross(left, up), left, up };
};

/** The person in the room at one moment: mid foot under the origin, facing along x. */
export const poseSkeleton = (body: Body, stance: Stance): Skeleton => {
  const sign = sideSign(stance.support);
  const hipHalf = (0.5 - HIP_INWARD) * body.asisWidth;
  const pelvis = axesFromAngles(stance.pelvisYaw, stance.pelvisTilt, -sign * stance.obliquity);
  const ankle: Vec = [0, sign * body.stanceHalfWidth, body.ankleHeight];
  const pelvisY = sign * stance.shift * SHIFT_SHARE * body.asisWidth + stance.swayMm[0];
  const toHip = scale(pelvis.left, sign * hipHalf);
  const hipX = stance.swayMm[1] + toHip[0];
  const hipY = pelvisY + toHip[1];
  const straight = body.thigh + body.shank;
  const hip: Vec = [
    hipX,
    hipY,
    ankle[2] + Math.sqrt(straight ** 2 - (hipX - ankle[0]) ** 2 - (hipY - ankle[1]) ** 2),
  ];
  const hipMiddle = sub(hip, toHip);
  const legUp = unit(sub(hip, ankle));
  const thigh = axesAlongBone(legUp, stance.femurYaw);
  const footYaw = sign * stance.footTurnOut;
  const trunkRoll = -sign * stance.trunkLean;
  const trunk = axesFromAngles(stance.trunkYaw, 0, trunkRoll);
  return {
    body,
    support: {
      sign,
      hip,
      knee: add(ankle, scale(legUp, body.shank)),
      ankle,
      thigh,
      shank: axesAlongBone(legUp, 0.6 * stance.femurYaw + 0.25 * footYaw),
      foot: axesFromAngles(footYaw, 0, 0),
    },
    lifted: liftedLeg(body, stance, sub(hipMiddle, toHip), sign === 1 ? -1 : 1),
    pelvis,
    hipMiddle,
    asisMiddle: along(hipMiddle, pelvis, [
      HIP_BEHIND * body.asisWidth,
      0,
      HIP_BELOW * body.asisWidth,
    ]),
    trunk,
    acromionMiddle: along(hipMiddle, trunk, [0, 0, body.trunk]),
  };
};

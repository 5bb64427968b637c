import { seededRandom } from './random.ts';
import { repAt, type RepPlan, scriptedLift, scriptedShift, type Side } from './script.ts';
import { through, type TurnShape } from './turn-shapes.ts';

/** Everything the skeleton needs at one moment. Degrees, except where named. */
export interface Stance {
  readonly rep: number;
  readonly support: Side;
  readonly lift: number;
  /** 0 on both feet, 1 over the support leg */
  readonly shift: number;
  readonly pelvisYaw: number;
  readonly femurYaw: number;
  readonly trunkYaw: number;
  /** + lifted side up */
  readonly obliquity: number;
  /** + backward */
  readonly pelvisTilt: number;
  /** + to the support side */
  readonly trunkLean: number;
  /** of the support foot, + toes outward */
  readonly footTurnOut: number;
  readonly swayMm: readonly [number, number];
}

/** +1 standing on the left leg, −1 on the right: the side's direction along y and the turn's sign. */
export const sideSign = (side: Side): 1 | -1 => (side === 'left' ? 1 : -1);

export interface Habits {
  /** yaw of the pelvis and of the femur in quiet stance: the turn is counted from them */
  readonly quietPelvisYaw: number;
  readonly quietFemurOut: number;
  readonly footTurnOut: number;
  readonly hikeAt90: number;
  readonly leanAt90: number;
  readonly tiltAt90: number;
}

export const USUAL_HABITS: Habits = {
  quietPelvisYaw: 0.8,
  quietFemurOut: 1.5,
  footTurnOut: 9,
  hikeAt90: 6,
  leanAt90: 3,
  tiltAt90: 6,
};

/** A slow, smooth wander of about ±1, different for each `channel`. */
const wander = (seed: number, channel: number): ((time: number) => number) => {
  const random = seededRandom(seed * 31 + channel * 977);
  const [a, b, c] = [random() * 6.28, random() * 6.28, random() * 6.28];
  return (time) =>
    0.5 * Math.sin(1.9 * time + a) +
    0.3 * Math.sin(3.7 * time + b) +
    0.2 * Math.sin(6.1 * time + c);
};

/** The person's posture at any moment of the take, seconds. */
export const stanceOver = (
  reps: readonly RepPlan[],
  shapes: Readonly<Record<Side, TurnShape>>,
  habits: Habits,
  seed: number,
): ((time: number) => Stance) => {
  const drift = [1, 2, 3, 4, 5].map((channel) => wander(seed, channel));
  return (time) => {
    const index = repAt(reps, time);
    const rep = reps[index];
    if (rep === undefined) throw new RangeError('a take needs at least one rep');
    const shape = shapes[rep.support];
    const lift = scriptedLift(rep, time);
    const shift = scriptedShift(rep, time);
    const sigma = sideSign(rep.support);
    const [d0, d1, d2, d3, d4] = drift.map((channel) => channel(time)) as [
      number,
      number,
      number,
      number,
      number,
    ];
    const pelvisPart = rep.turnScale * through(shape.lift, shape.pelvisPart, lift);
    const thighPart = rep.turnScale * through(shape.lift, shape.thighPart, lift);
    const raised = lift / 90;
    const pelvisYaw = habits.quietPelvisYaw - sigma * pelvisPart + 0.25 * d0;
    return {
      rep: index,
      support: rep.support,
      lift,
      shift,
      pelvisYaw,
      femurYaw: sigma * (habits.quietFemurOut + thighPart) + 0.15 * d1,
      trunkYaw: 0.35 * pelvisYaw + 0.4 * d2,
      obliquity: 1.6 * shift + (habits.hikeAt90 - 1.6) * raised + 0.1 * d2,
      pelvisTilt: habits.tiltAt90 * raised,
      trunkLean: 1.4 * shift + (habits.leanAt90 - 1.4) * raised + 0.15 * d3,
      footTurnOut: habits.footTurnOut,
      swayMm: [2.2 * d3 * (0.4 + shift), 1.6 * d4 * (0.4 + shift)],
    };
  };
};

import type { Chance } from './chance.ts';

/** Directions and heights of one instant. Angles in degrees, support side's outward positive. */
export interface Pose {
  readonly lift: number;
  /** Hip's turn since quiet stance, and how much of it the femur does. */
  readonly turn: number;
  readonly femurPart: number;
  /** Femur's and pelvis's directions, positive to the athlete's left. */
  readonly femurYaw: number;
  readonly pelvisYaw: number;
  /** Lifted side of the pelvis raised. */
  readonly hike: number;
  /** Pelvis tipped backwards. */
  readonly backTilt: number;
  /** Pelvis towards the support side of its quiet place, mm. */
  readonly shift: number;
}

/** One lift of one person. Times in ms from the clip's start. */
export interface Movement {
  readonly poseAt: (time: number) => Pose;
  /** Where weight begins to shift, the foot leaves, the top is reached, lowering begins and ends. */
  readonly shiftFrom: number;
  readonly footOff: number;
  readonly top: number;
  readonly lowerFrom: number;
  readonly footDown: number;
  readonly highest: number;
}

/** What a person's lifts have in common. */
export interface Habit {
  /** True change of turn from 60° to 90°, degrees, and the part of a turn before 60°. */
  readonly change: number;
  readonly before: number;
  readonly beyond: number;
  /** Lift at which the turn is fastest, and how gradual it is. */
  readonly centre: number;
  readonly spread: number;
  readonly femurShare: number;
  readonly highest: number;
  readonly hikeAt90: number;
  readonly backTiltAt90: number;
  readonly weightShift: number;
  readonly facing: number;
}

/** Between reps of one person, degrees. */
export const REP_SPREAD = 1.5;

export const habitOf = ({ normal, between }: Chance, change: number): Habit => ({
  change,
  before: Math.min(6, Math.max(-6, normal(0, 3))),
  beyond: normal(0, 3),
  centre: between(68, 82),
  spread: between(5, 14),
  femurShare: between(0.25, 0.55),
  highest: between(96, 116),
  hikeAt90: normal(4, 4),
  backTiltAt90: between(5, 14),
  weightShift: between(25, 65),
  facing: normal(0, 4),
});

const logistic = (x: number): number => 1 / (1 + Math.exp(-x));
const smooth = (from: number, to: number, x: number): number => {
  const t = Math.min(1, Math.max(0, (x - from) / (to - from)));
  return t * t * t * (10 + t * (6 * t - 15));
};

/** Turn at a lift: exactly `change` from 60° to 90°. */
const turnAt = ({ before, beyond, centre, spread }: Habit, change: number) => {
  const step = (lift: number): number => logistic((lift - centre) / spread);
  const size = change / (step(90) - step(60));
  return (lift: number): number =>
    before * smooth(20, 60, lift) + size * (step(lift) - step(0)) + beyond * smooth(90, 120, lift);
};

/** @param sigma +1 standing on the left leg, −1 on the right */
export const movementOf = (chance: Chance, habit: Habit, sigma: 1 | -1): Movement => {
  const change = habit.change + chance.normal(0, REP_SPREAD);
  const turn = turnAt(habit, change);
  const shiftFrom = chance.between(1500, 2200);
  // weight shifts 0.3–0.6 s before the foot leaves (common practice, no source)
  const footOff = shiftFrom + chance.between(300, 600);
  const top = footOff + chance.between(1100, 2300);
  const lowerFrom = top + chance.between(300, 800);
  const footDown = lowerFrom + chance.between(900, 1600);
  const highest = habit.highest + chance.normal(0, 2);
  const sway = { size: chance.normal(0, 1.5), at: chance.between(0, 6), period: 2600 };
  const whole = chance.normal(0, 3);
  return {
    shiftFrom,
    footOff,
    top,
    lowerFrom,
    footDown,
    highest,
    poseAt: (time) => {
      const up = smooth(footOff, top, time) - smooth(lowerFrom, footDown, time);
      const lift = highest * up;
      const share = lift / 90;
      const turned = turn(lift);
      // the whole body sways and follows the lift: it turns femur and pelvis alike
      const both =
        habit.facing + whole * share + sway.size * Math.sin(time / (sway.period / 6.3) + sway.at);
      return {
        lift,
        turn: turned,
        femurPart: habit.femurShare * turned,
        femurYaw: both + sigma * habit.femurShare * turned,
        pelvisYaw: both - sigma * (1 - habit.femurShare) * turned,
        hike: habit.hikeAt90 * share,
        backTilt: habit.backTiltAt90 * share,
        shift:
          habit.weightShift *
          (smooth(shiftFrom, footOff, time) - smooth(lowerFrom, footDown, time)),
      };
    },
  };
};

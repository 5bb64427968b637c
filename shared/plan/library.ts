import type { Exercise } from './exercise.ts';
import { footTripod } from './exercises/foot-tripod.ts';
import { halfKneelingShift } from './exercises/half-kneeling-shift.ts';
import { holdTo60 } from './exercises/hold-to-60.ts';
import { holdTo90 } from './exercises/hold-to-90.ts';
import { lyingKneeLift } from './exercises/lying-knee-lift.ts';
import { marchDrill } from './exercises/march-drill.ts';
import { singleLegHinge } from './exercises/single-leg-hinge.ts';
import { skipDrill } from './exercises/skip-drill.ts';
import { splitSquat } from './exercises/split-squat.ts';
import { staggeredHinge } from './exercises/staggered-hinge.ts';
import { stepUp } from './exercises/step-up.ts';
import { supportedHinge } from './exercises/supported-hinge.ts';
import { wallMarch } from './exercises/wall-march.ts';

/** The library, from the easiest upwards: one file an exercise, one line here. */
export const EXERCISES = [
  footTripod,
  supportedHinge,
  staggeredHinge,
  halfKneelingShift,
  splitSquat,
  singleLegHinge,
  lyingKneeLift,
  holdTo60,
  holdTo90,
  stepUp,
  wallMarch,
  marchDrill,
  skipDrill,
] as const;

export type ExerciseId = (typeof EXERCISES)[number]['id'];

/** The exercise of this id. */
export const exerciseOf = (id: ExerciseId): Exercise<ExerciseId> => {
  const known = EXERCISES.find((each) => each.id === id);
  if (!known) throw new Error(`There is no exercise ${id}.`);
  return known;
};

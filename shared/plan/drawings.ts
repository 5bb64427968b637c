import type { ExerciseDrawing } from './figure/drawing.ts';
import type { ExerciseId } from './library.ts';
import { footTripod } from './poses/foot-tripod.ts';
import { halfKneelingShift } from './poses/half-kneeling-shift.ts';
import { holdTo60 } from './poses/hold-to-60.ts';
import { holdTo90 } from './poses/hold-to-90.ts';
import { lyingKneeLift } from './poses/lying-knee-lift.ts';
import { marchDrill } from './poses/march-drill.ts';
import { singleLegHinge } from './poses/single-leg-hinge.ts';
import { skipDrill } from './poses/skip-drill.ts';
import { splitSquat } from './poses/split-squat.ts';
import { staggeredHinge } from './poses/staggered-hinge.ts';
import { stepUp } from './poses/step-up.ts';
import { supportedHinge } from './poses/supported-hinge.ts';
import { wallMarch } from './poses/wall-march.ts';

/** How each exercise is drawn; one that has no drawing fails the type check. */
export const DRAWINGS: Readonly<Record<ExerciseId, ExerciseDrawing>> = {
  'foot-tripod': footTripod,
  'half-kneeling-shift': halfKneelingShift,
  'hold-to-60': holdTo60,
  'hold-to-90': holdTo90,
  'lying-knee-lift': lyingKneeLift,
  'march-drill': marchDrill,
  'single-leg-hinge': singleLegHinge,
  'skip-drill': skipDrill,
  'split-squat': splitSquat,
  'staggered-hinge': staggeredHinge,
  'step-up': stepUp,
  'supported-hinge': supportedHinge,
  'wall-march': wallMarch,
};

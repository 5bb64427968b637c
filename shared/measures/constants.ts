/** A number of the method and where it comes from. */
export interface Constant {
  readonly value: number;
  readonly unit: string;
  readonly meaning: string;
  readonly source: string;
}

const MODEL = 'from our model, no source';
const PRACTICE = 'common practice, no source';

const constant = (value: number, unit: string, meaning: string, source: string): Constant => ({
  value,
  unit,
  meaning,
  source,
});

/** Every number of the engines that does not follow from geometry. Shown on the method page. */
export const CONSTANTS = {
  hipInward: constant(
    0.14,
    'of the ASIS distance',
    'hip centre inside its ASIS, along the ASIS line',
    'near Bell et al. 1989, 14 %',
  ),
  hipBelow: constant(
    0.345,
    'of the ASIS distance',
    'hip centre below the ASIS line',
    'from our model, no source; near Bell et al. 1989, 30 %',
  ),
  outlineDepth: constant(70, 'mm', 'ASIS line in front of the pelvis outline', MODEL),
  ankleHeight: constant(75, 'mm', 'ankle centre above the floor', MODEL),
  skinToFemur: constant(55, 'mm', 'femur axis behind the skin under the thigh strap', MODEL),
  footLength: constant(0.106, 'of body height', 'ankle to toe, along the floor', MODEL),
  anatomicalError: constant(3, 'px', 'typical error of one anatomical mark', MODEL),
  pointerError: constant(1.5, 'px', 'typical error of a mark on a pointer or tape', MODEL),
  randomPart: constant(0.8, '', 'part of a mark’s error that differs from frame to frame', MODEL),
  outlineFactor: constant(1.4, '', 'error of a pelvis outline against other marks', MODEL),
  trackedFactor: constant(1.7, '', 'error of a tracked mark against one by hand', MODEL),
  cosineFloor: constant(0.3, '', 'smallest cosine that an error is divided by', MODEL),
  sineLimit: constant(0.98, '', 'largest sine of a yaw', MODEL),
  leastVariance: constant(0.25, 'degrees²', 'variance that caps the weight of a frame', MODEL),
  leastLift: constant(25, 'degrees', 'lift under which a frame has no weight', MODEL),
  liftModelError: constant(2, 'degrees', '± of lift from its model', MODEL),
  liftModelErrorNoLens: constant(7, 'degrees', '± of lift without the lens height', MODEL),
  tiedGap: constant(
    250,
    'ms',
    'longest gap between marked frames of a side clip that a front clip’s lift is read across',
    MODEL,
  ),
  footOff: constant(25, 'mm', 'height of the lifted ankle that counts as foot off', MODEL),
  still: constant(15, 'mm', 'sway of ankle or pelvis that still counts as quiet', PRACTICE),
  fallBack: constant(8, 'degrees', 'drop under the highest lift that leaves the rise', MODEL),
  plateau: constant(5, 'degrees', 'drop under the top that still counts as the top', MODEL),
  corner: constant(5, 'degrees', 'half-width of the rounded corners of the fit', MODEL),
  repSpread: constant(1.5, 'degrees', 'spread of true turn between reps of one person', MODEL),
  thighSpread: constant(4, 'degrees', 'SD of the planted thigh’s turn under the assumption', MODEL),
  turnReach: constant(20, 'degrees', 'lift over which the speed of turning stays alike', MODEL),
  wholeBody: constant(
    2,
    'degrees',
    'SD by which the whole body turns over the foot per 30°',
    MODEL,
  ),
  trackedFor: constant(500, 'ms', 'time over which a tracked mark keeps its error', MODEL),
  stanceSpread: constant(1, 'degrees', 'SD between the zero of a quiet stance and its rise', MODEL),
  beltSlip: constant(
    1.2,
    'degrees',
    'engine 2: SD of the belt’s slip over the pelvis, 60° to 90°',
    MODEL,
  ),
  kneecapSlip: constant(
    2.7,
    'degrees',
    'engine 2: SD of the knee’s skin over the femur, 60° to 90°',
    MODEL,
  ),
  beltPointerSlip: constant(
    1,
    'degrees',
    'SD of the belt’s slip over the pelvis, 60° to 90°',
    MODEL,
  ),
  outlineSlip: constant(
    2,
    'degrees',
    'SD of the outline’s slip over the pelvis, 60° to 90°',
    MODEL,
  ),
  kneeSlip: constant(1.8, 'degrees', 'SD of the knee’s skin over the femur, 60° to 90°', MODEL),
  twiceTheSlip: constant(1 / 3, '', 'chance that skin slips twice as much as assumed', MODEL),
  gated: constant(
    0.5,
    '',
    'part of the belief in turns that begin and end at the gates; the rest: anywhere',
    MODEL,
  ),
  slipShared: constant(0.7, '', 'part of a slip’s variance that all reps share', MODEL),
  prior: constant(8, 'degrees', 'SD of the weak prior of the change of turn', MODEL),
  uncertainLimit: constant(6, 'degrees', 'standard uncertainty above which nothing is read', MODEL),
} as const satisfies Record<string, Constant>;

/** Systematic error of the change of turn: u = √(u² + (q d)²), degrees. From our model, no source. */
export const SYSTEMATIC = {
  bare: { u: 3.0, q: 0.1 },
  belt: { u: 2.4, q: 0.08 },
  'belt+thigh': { u: 1.6, q: 0.05 },
  'belt+assumption': { u: 1.6, q: 0.06 },
} as const;

/** Forms and the API take a thigh pointer's length from the skin to its tip, mm. */
export const thighPointerFromSkin = (skinToTipMm: number): number =>
  skinToTipMm + CONSTANTS.skinToFemur.value;

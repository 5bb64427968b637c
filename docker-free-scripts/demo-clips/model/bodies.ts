/**
 * Invented bodies, lengths in mm. Proportions of segments to body height follow common
 * anthropometric practice (thigh and shank near a quarter of the height each, ankle 4 %); girths and
 * widths are our own choice, no source.
 */
export interface Body {
  readonly height: number;
  readonly thigh: number;
  readonly shank: number;
  readonly ankleHeight: number;
  /** ankle to the tip of the toes, horizontally: 0.106 of the height, as the foot measure assumes */
  readonly ankleToToe: number;
  readonly ankleToHeel: number;
  /** distance between the two ASIS */
  readonly asisWidth: number;
  /** half the widest pelvis outline at the height of the ASIS */
  readonly pelvisHalfWidth: number;
  readonly kneeWidth: number;
  /** mid hip centres to the line between the acromia */
  readonly trunk: number;
  readonly acromionWidth: number;
  /** half the distance of the ankles in quiet stance */
  readonly stanceHalfWidth: number;
  /** thickness of limbs and trunk against the drawn norm */
  readonly girth: number;
}

const build = (height: number, own: Partial<Body> = {}): Body => ({
  height,
  thigh: 0.242 * height,
  shank: 0.245 * height,
  ankleHeight: 0.043 * height,
  ankleToToe: 0.106 * height,
  ankleToHeel: 0.046 * height,
  asisWidth: 0.136 * height,
  pelvisHalfWidth: 0.087 * height,
  kneeWidth: 0.061 * height,
  trunk: 0.285 * height,
  acromionWidth: 0.208 * height,
  stanceHalfWidth: 0.051 * height,
  girth: 1,
  ...own,
});

export const BODIES = {
  woman: build(1680),
  man: build(1810, {
    asisWidth: 236,
    pelvisHalfWidth: 151,
    kneeWidth: 112,
    acromionWidth: 398,
    trunk: 525,
    girth: 1.03,
  }),
  child: build(1490, {
    asisWidth: 200,
    pelvisHalfWidth: 124,
    kneeWidth: 88,
    acromionWidth: 300,
    trunk: 418,
    girth: 0.94,
  }),
  olderMan: build(1740, {
    asisWidth: 240,
    pelvisHalfWidth: 157,
    kneeWidth: 110,
    acromionWidth: 376,
    trunk: 498,
    girth: 1.06,
  }),
  olderWoman: build(1620, {
    asisWidth: 232,
    pelvisHalfWidth: 147,
    kneeWidth: 102,
    acromionWidth: 336,
    girth: 1.05,
  }),
  tallWoman: build(1760, { asisWidth: 232, acromionWidth: 358, girth: 0.98 }),
} as const satisfies Record<string, Body>;

export type BodyName = keyof typeof BODIES;

/** Hip centre seen from the ASIS, fractions of their distance: the constants of the measurement. */
export const HIP_INWARD = 0.14;
export const HIP_BELOW = 0.345;
/** The hip centre lies behind the ASIS: near Bell's 22 %, ours a little more for the drawn pelvis. */
export const HIP_BEHIND = 0.25;
/** Middle of the pelvis outline behind the ASIS line, mm. */
export const OUTLINE_BEHIND = 70;
/** Femur axis to the front skin where the strap sits, mm. */
export const STRAP_SKIN = 55;
/** Strap above the knee centre, mm. */
export const STRAP_ABOVE_KNEE = 62;

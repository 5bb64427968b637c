import { type FramePoint, framePoint } from '#shared/geometry/points.ts';
import { CONSTANTS } from './constants.ts';

const INWARD = CONSTANTS.hipInward.value;
const BELOW = CONSTANTS.hipBelow.value;

interface Line {
  readonly eu: number;
  readonly ev: number;
  readonly nu: number;
  readonly nv: number;
}

/** Unit vector along a → b and the one square to it that points down the picture. */
const axes = (a: FramePoint, b: FramePoint): Line => {
  const length = Math.hypot(b.u - a.u, b.v - a.v);
  const eu = (b.u - a.u) / length;
  const ev = (b.v - a.v) / length;
  return eu >= 0 ? { eu, ev, nu: -ev, nv: eu } : { eu, ev, nu: ev, nv: -eu };
};

/**
 * Hip centre of the side of `own`, from both ASIS and the ASIS distance of the quiet stance (px): a
 * turned pelvis looks narrower, its hip centre does not come nearer.
 */
export const hipCentre = (own: FramePoint, other: FramePoint, width: number): FramePoint => {
  const { eu, ev, nu, nv } = axes(own, other);
  return framePoint(
    own.u + width * (INWARD * eu + BELOW * nu),
    own.v + width * (INWARD * ev + BELOW * nv),
  );
};

/** Middle of both hip centres. */
export const hipMiddle = (a: FramePoint, b: FramePoint, width: number): FramePoint => {
  const { nu, nv } = axes(a, b);
  return framePoint((a.u + b.u) / 2 + width * BELOW * nu, (a.v + b.v) / 2 + width * BELOW * nv);
};

/** Position of a hip centre from the middle of the ASIS line, mm. */
export interface HipOffset {
  readonly behind: number;
  readonly below: number;
  readonly outward: number;
}

/**
 * Hip centre from pelvic width and depth (ASIS line to PSIS line), mm. Harrington et al. 2007,
 * J Biomech 40:595–602 (formula second-hand). For the side view and for comparison: engine 1 uses
 * its own two constants.
 */
export const harringtonHipCentre = (width: number, depth: number): HipOffset => ({
  behind: 0.24 * depth + 9.9,
  below: 0.3 * width + 10.9,
  outward: 0.33 * width + 7.3,
});

/**
 * Hip centre from its own ASIS, mm: 22 % of the ASIS distance behind, 30 % below, 14 % inward. Bell
 * et al. 1989 (seen).
 */
export const bellHipCentre = (
  width: number,
): { readonly behind: number; readonly below: number; readonly inward: number } => ({
  behind: 0.22 * width,
  below: 0.3 * width,
  inward: 0.14 * width,
});

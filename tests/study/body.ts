import type { Chance } from './chance.ts';

/** One person's bones and sticks, mm and degrees. */
export interface Body {
  readonly thigh: number;
  readonly shank: number;
  readonly ankleHeight: number;
  /** Between both ASIS; their line lies this far ahead of and above the hip centres' middle. */
  readonly asisWidth: number;
  readonly asisAhead: number;
  readonly asisAbove: number;
  readonly hipHalf: number;
  /** Lateral outline of the pelvis: half its width, and how far its middle lies behind the ASIS. */
  readonly outlineHalf: number;
  readonly outlineBehind: number;
  readonly kneeWidth: number;
  readonly kneecapAhead: number;
  readonly kneecapAbove: number;
  /** Belt pointer: ASIS line to tip, how it sits on the belt, where it points. */
  readonly beltPointer: number;
  readonly beltAside: number;
  readonly beltAbove: number;
  readonly beltYaw: number;
  /** Thigh pointer: skin to tip, the strap's radius and height above the knee, where it points. */
  readonly thighPointer: number;
  readonly strapRadius: number;
  readonly strapAbove: number;
  readonly thighYaw: number;
}

/** Spreads: from our model, no source. */
export const bodyOf = ({ normal, between }: Chance): Body => {
  const height = between(1550, 1900);
  const asisWidth = Math.min(280, Math.max(200, normal(240, 18)));
  const kneeWidth = normal(95, 5);
  return {
    thigh: height * normal(0.245, 0.006),
    shank: height * normal(0.246, 0.006),
    ankleHeight: height * 0.042,
    asisWidth,
    asisAhead: normal(75, 10),
    asisAbove: normal(82, 5),
    hipHalf: asisWidth * normal(0.355, 0.012),
    outlineHalf: asisWidth * normal(0.65, 0.02),
    outlineBehind: normal(70, 6),
    kneeWidth,
    kneecapAhead: (kneeWidth / 2) * normal(1, 0.06),
    kneecapAbove: normal(6, 6),
    beltPointer: between(120, 150),
    beltAside: normal(0, 5),
    beltAbove: normal(-15, 6),
    beltYaw: normal(0, 5),
    thighPointer: between(110, 140),
    strapRadius: normal(55, 4),
    strapAbove: normal(62, 7),
    thighYaw: normal(0, 4),
  };
};

import { distance, type FramePoint, meanPoint } from '#shared/geometry/points.ts';
import { LANDMARK_IDS, type LandmarkId } from '#shared/landmarks/types.ts';
import { CONSTANTS } from './constants.ts';
import { hipCentre } from './hip-centre.ts';
import type { LevelFrame } from './level.ts';
import type { Rig } from './rig.ts';

/** Fewest quiet frames a mark's mean may rest on. */
export const LEAST_QUIET = 3;

/** The quiet stance all angles are zeroed at. Lengths in px; null where its marks are missing. */
export interface Reference {
  readonly frames: readonly LevelFrame[];
  readonly means: Readonly<Partial<Record<LandmarkId, FramePoint>>>;
  /** ASIS distance. */
  readonly width: number | null;
  /** Width of the support knee between its edges. */
  readonly kneeWidth: number | null;
  /** Hip centre to lifted knee, down the picture. */
  readonly thigh: number | null;
  /** v of the horizon, the height at which the lens looks level. */
  readonly horizon: number | null;
}

const positive = (value: number | null): number | null =>
  value !== null && Number.isFinite(value) && value > 0 ? value : null;

/** Mean of each mark over the quiet frames that carry it, at least three. */
export const referenceOf = (frames: readonly LevelFrame[], rig: Rig): Reference => {
  const means: Partial<Record<LandmarkId, FramePoint>> = {};
  for (const id of LANDMARK_IDS) {
    const points = frames.flatMap((frame) => frame.marks[id] ?? []);
    if (points.length < LEAST_QUIET) continue;
    const mean = meanPoint(points);
    if (mean) means[id] = mean;
  }
  const support = means['asis-support'];
  const lifted = means['asis-lifted'];
  const width = positive(support && lifted ? distance(support, lifted) : null);
  const inner = means['knee-inner'];
  const outer = means['knee-outer'];
  const knee = means['lifted-knee'];
  const ankle = means['ankle-support'];
  const hip = support && lifted && width ? hipCentre(lifted, support, width) : null;
  const lens = rig.lensHeightMm;
  const horizon =
    lens !== null
      ? ankle
        ? ankle.v - (lens - CONSTANTS.ankleHeight.value) / rig.mmPerPx
        : null
      : support && lifted
        ? (support.v + lifted.v) / 2
        : null;
  return {
    frames,
    means,
    width,
    kneeWidth: positive(inner && outer ? Math.abs(inner.u - outer.u) : null),
    thigh: positive(hip && knee ? knee.v - hip.v : null),
    horizon,
  };
};

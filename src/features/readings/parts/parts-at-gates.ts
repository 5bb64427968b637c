import { type Degrees, degrees } from '#shared/geometry/units.ts';
import type { ReadingResult } from '#shared/reading/types.ts';

export interface Parts {
  readonly pelvis: Degrees;
  readonly thigh: Degrees;
}

/** Marked frames that speak for 60°, degrees of lift. */
const NEAR_60 = [54, 66] as const;

/**
 * Pelvis and thigh parts of the turn at 60° and at 90°. At 60°: the weighted mean of the marked frames
 * near it, over the used reps; at 90°: that and the reading's own change, so that the drawings differ by
 * exactly what was measured. Null where nothing is measured.
 */
export const partsAtGates = (
  result: ReadingResult,
): { readonly at60: Parts; readonly at90: Parts } | null => {
  const { figures, reps } = result;
  if (!figures) return null;
  let weights = 0;
  let pelvis = 0;
  let thigh = 0;
  for (const { used, frames } of reps)
    for (const { lift, weight, pelvisPart, thighPart, inFit } of used ? frames : []) {
      if (!inFit || lift === null || weight === null || pelvisPart === null || thighPart === null)
        continue;
      if (lift < NEAR_60[0] || lift > NEAR_60[1]) continue;
      weights += weight;
      pelvis += weight * pelvisPart;
      thigh += weight * thighPart;
    }
  if (weights === 0) return null;
  const at60 = { pelvis: degrees(pelvis / weights), thigh: degrees(thigh / weights) };
  return {
    at60,
    at90: {
      pelvis: degrees(at60.pelvis + figures.pelvis.value),
      thigh: degrees(at60.thigh + figures.thigh.value),
    },
  };
};

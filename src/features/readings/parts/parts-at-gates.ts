import { type Degrees, degrees } from '#shared/geometry/units.ts';
import type { ReadingResult } from '#shared/reading/types.ts';

export interface Parts {
  readonly pelvis: Degrees;
  readonly thigh: Degrees;
}

/** Marked frames so near the lower gate speak for it, degrees of lift. */
const NEAR = 6;

/**
 * Pelvis and thigh parts of the turn at both gates. At the lower: the weighted mean of the marked frames
 * near it, over the used reps; at the upper: that and the reading's own change, so that the drawings differ
 * by exactly what was measured. Null where nothing is measured.
 */
export const partsAtGates = (
  result: ReadingResult,
): { readonly atFrom: Parts; readonly atTo: Parts } | null => {
  const { figures, reps, rules } = result;
  if (!figures) return null;
  let weights = 0;
  let pelvis = 0;
  let thigh = 0;
  for (const { used, frames } of reps)
    for (const { lift, weight, pelvisPart, thighPart, inFit } of used ? frames : []) {
      if (!inFit || lift === null || weight === null || pelvisPart === null || thighPart === null)
        continue;
      if (Math.abs(lift - rules.gateFrom) > NEAR) continue;
      weights += weight;
      pelvis += weight * pelvisPart;
      thigh += weight * thighPart;
    }
  if (weights === 0) return null;
  const atFrom = { pelvis: degrees(pelvis / weights), thigh: degrees(thigh / weights) };
  return {
    atFrom,
    atTo: {
      pelvis: degrees(atFrom.pelvis + figures.pelvis.value),
      thigh: degrees(atFrom.thigh + figures.thigh.value),
    },
  };
};

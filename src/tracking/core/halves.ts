import type { Aligned } from './align.ts';
import { samplePatch } from './patch.ts';
import type { Plane } from './plane.ts';
import type { Template } from './template.ts';

/** Ways in which the patch is cut through its middle. */
const CUTS = Array.from({ length: 8 }, (_, n) => {
  const angle = (n * Math.PI) / 4;
  return { x: Math.cos(angle), y: Math.sin(angle) };
});
/** A half with less contrast has nothing to be known by, grey values. */
const LEAST_CONTRAST = 4;

/**
 * Likeness of the half that is least alike, −1 to 1, each half with its own brightness and contrast. Where the patch
 * holds two things that move apart, whatever decides its place fits on one half and not on the other.
 */
export const leastAlikeHalf = (plane: Plane, template: Template, found: Aligned): number => {
  const { radius, values, window } = template;
  const patch = new Float32Array(values.length);
  samplePatch(plane, found.warp, radius, patch);
  let least = 1;
  for (const cut of CUTS) {
    let [weights, a, b, aa, bb, ab] = [0, 0, 0, 0, 0, 0];
    for (let y = -radius, k = 0; y <= radius; y += 1) {
      for (let x = -radius; x <= radius; x += 1, k += 1) {
        if (x * cut.x + y * cut.y <= 0.5) continue;
        const weight = window[k] as number;
        const [p, q] = [patch[k] as number, values[k] as number];
        weights += weight;
        a += weight * p;
        b += weight * q;
        aa += weight * p * p;
        bb += weight * q * q;
        ab += weight * p * q;
      }
    }
    const own = bb / weights - (b / weights) ** 2;
    if (own < LEAST_CONTRAST ** 2) continue;
    const seen = aa / weights - (a / weights) ** 2;
    const both = ab / weights - (a * b) / weights ** 2;
    least = Math.min(least, seen > 0 ? both / Math.sqrt(own * seen) : 0);
  }
  return least;
};

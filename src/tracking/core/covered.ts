import type { Aligned } from './align.ts';
import { samplePatch } from './patch.ts';
import type { Plane } from './plane.ts';
import type { Template } from './template.ts';

/** The patch is looked at in so many cells each way. */
const CELLS = 5;
/** A cell that differs by less than this is never taken as covered, grey values. */
const LEAST_DIFFERENCE = 5;

/**
 * The share of the patch where the picture shows something else altogether, 0 to 1. What covers a
 * point differs in some cells and not at all in others; blur, light and turning differ everywhere a
 * little. Brightness and contrast are taken out as the whole patch has them.
 */
export const coveredShare = (plane: Plane, template: Template, found: Aligned): number => {
  const { radius, values, window, contrast } = template;
  const size = 2 * radius + 1;
  const patch = new Float32Array(size * size);
  samplePatch(plane, found.warp, radius, patch);
  let mean = 0;
  for (let k = 0; k < patch.length; k += 1) mean += (patch[k] as number) * (window[k] as number);
  const differences = new Float64Array(CELLS * CELLS);
  const counts = new Float64Array(CELLS * CELLS);
  for (let y = 0, k = 0; y < size; y += 1) {
    const row = Math.floor((y * CELLS) / size) * CELLS;
    for (let x = 0; x < size; x += 1, k += 1) {
      if (window[k] === 0) continue;
      const cell = row + Math.floor((x * CELLS) / size);
      const difference = (patch[k] as number) - mean - found.gain * (values[k] as number);
      differences[cell] = (differences[cell] as number) + difference * difference;
      counts[cell] = (counts[cell] as number) + 1;
    }
  }
  const limit = Math.max(LEAST_DIFFERENCE, contrast) ** 2;
  let covered = 0;
  let all = 0;
  for (let cell = 0; cell < counts.length; cell += 1) {
    const count = counts[cell] as number;
    all += count;
    if ((differences[cell] as number) > limit * count) covered += count;
  }
  return covered / all;
};

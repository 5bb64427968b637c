import type { Scale } from '#shared/contracts/clips.ts';
import { distance } from '#shared/geometry/points.ts';

/** Below this many pixels a length of known size says nothing about the scale. */
const LEAST_PX = 20;

/** Millimetres per pixel of the source frame; null where the scale is unknown or its two points coincide. */
export const mmPerPxOf = (scale: Scale | null): number | null => {
  if (scale === null) return null;
  if (scale.from === 'typed') return scale.mmPerPx;
  const px = distance(scale.a, scale.b);
  return px < LEAST_PX ? null : scale.lengthMm / px;
};

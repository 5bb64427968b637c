import { compare } from './align.ts';
import type { Plane } from './plane.ts';
import type { Template } from './template.ts';
import { movedTo, type Warp } from './warp.ts';

export interface Found {
  readonly warp: Warp;
  readonly correlation: number;
  /** The best likeness well away from the place found: close to `correlation` where it repeats. */
  readonly second: number;
}

/**
 * The whole-pixel place within `reach` of the warp's where the template is most like the picture.
 * Null where nothing there has any contrast.
 */
export const search = (
  plane: Plane,
  template: Template,
  about: Warp,
  reach: number,
): Found | null => {
  const side = 2 * reach + 1;
  const likeness = new Float32Array(side * side);
  let best = -1;
  let bestAt = -1;
  for (let dy = -reach, k = 0; dy <= reach; dy += 1) {
    for (let dx = -reach; dx <= reach; dx += 1, k += 1) {
      const { correlation, within } = compare(
        plane,
        template,
        movedTo(about, about.tx + dx, about.ty + dy),
      );
      const counted = within > 0.7 ? correlation : 0;
      likeness[k] = counted;
      if (counted > best) {
        best = counted;
        bestAt = k;
      }
    }
  }
  if (!(best > 0)) return null;
  const x = bestAt % side;
  const y = Math.floor(bestAt / side);
  const apart = Math.max(3, template.radius * 0.6);
  let second = 0;
  for (let k = 0; k < likeness.length; k += 1)
    if (Math.hypot((k % side) - x, Math.floor(k / side) - y) > apart)
      second = Math.max(second, likeness[k] as number);
  return {
    warp: movedTo(about, about.tx + x - reach, about.ty + y - reach),
    correlation: best,
    second,
  };
};

import { dotCandidate } from './dot-candidate.ts';
import type { Place } from './flow.ts';
import { outlineOf } from './outline.ts';
import type { Plane } from './plane.ts';

export interface FoundDot {
  readonly centre: Place;
  readonly radius: number;
  readonly tone: 'dark' | 'light';
}

/** How far from the touch a dot's middle may lie beyond its own radius, pixels. */
const REACH = 14;

/** What passes for round; set on rendered stickers, cloth and limbs of known truth. */
const LEAST_SHARE = 0.8;
const MOST_OVAL = 0.32;

/**
 * The round sticker under or close to a touch; null where there is none. A print's blob or a limb's
 * end is not taken for one: its edge is too wide, too rough or open.
 */
export const dotAt = (plane: Plane, touch: Place): FoundDot | null => {
  const candidate = dotCandidate(plane, touch, REACH);
  if (!candidate) return null;
  const outline = outlineOf(plane, candidate.centre, candidate.radius);
  if (!outline) return null;
  const { centre, radius, share, rough, oval, blur } = outline;
  const round =
    share >= LEAST_SHARE &&
    rough <= Math.max(0.45, 0.08 * radius) &&
    oval <= MOST_OVAL &&
    blur <= Math.max(2.4, 0.28 * radius) &&
    radius <= 22;
  const near = Math.hypot(centre.x - touch.x, centre.y - touch.y) <= radius + REACH;
  return round && near ? { centre, radius, tone: candidate.tone } : null;
};

import type { Place } from './flow.ts';
import { type Plane, sampleAt } from './plane.ts';

/** Something that differs from what is around it. */
export interface Candidate {
  readonly centre: Place;
  readonly radius: number;
  readonly tone: 'dark' | 'light';
}

/** Radii that are tried, pixels: each a quarter more than the one before. */
const RADII = [2.5, 3.1, 3.9, 4.9, 6.1, 7.6, 9.5, 12, 15, 18.5];
const AROUND = Array.from({ length: 12 }, (_, k) => {
  const angle = (k * Math.PI) / 6;
  return { x: Math.cos(angle), y: Math.sin(angle) };
});
/** Where the inside and what is around it are looked at, as parts of the radius. */
const INSIDE = 0.55;
const OUTSIDE = 1.45;
/** Grey values that a dot must differ by, at least. */
const LEAST_CONTRAST = 14;

interface Spread {
  readonly mean: number;
  readonly deviation: number;
}

const ringAt = (plane: Plane, x: number, y: number, radius: number): Spread => {
  let sum = 0;
  let squares = 0;
  for (const way of AROUND) {
    const value = sampleAt(plane, x + radius * way.x, y + radius * way.y);
    sum += value;
    squares += value * value;
  }
  const mean = sum / AROUND.length;
  return { mean, deviation: Math.sqrt(Math.max(0, squares / AROUND.length - mean * mean)) };
};

/** Difference of inside and outside less their own unevenness; 0 where that is nothing. */
export const standsOut = (plane: Plane, x: number, y: number, radius: number): number => {
  const outside = ringAt(plane, x, y, OUTSIDE * radius);
  const inside = ringAt(plane, x, y, INSIDE * radius);
  const difference = inside.mean - outside.mean;
  const clear = Math.abs(difference) - inside.deviation - outside.deviation;
  return clear > LEAST_CONTRAST / 2 && Math.abs(difference) > LEAST_CONTRAST
    ? Math.sign(difference) * clear
    : 0;
};

/** Of several, the one that stands out most, those close to the touch before those farther off. */
export const dotCandidate = (plane: Plane, touch: Place, reach: number): Candidate | null => {
  let best: Candidate | null = null;
  let most = 0;
  for (const radius of RADII) {
    const step = Math.max(1, radius / 4);
    const far = reach + radius / 2;
    for (let dy = -far; dy <= far; dy += step) {
      for (let dx = -far; dx <= far; dx += step) {
        const away = Math.hypot(dx, dy);
        if (away > far) continue;
        const found = standsOut(plane, touch.x + dx, touch.y + dy, radius);
        const worth = Math.abs(found) * (1 - (0.5 * away) / (far + radius));
        if (worth <= most) continue;
        most = worth;
        best = {
          centre: { x: touch.x + dx, y: touch.y + dy },
          radius,
          tone: found < 0 ? 'dark' : 'light',
        };
      }
    }
  }
  return best;
};

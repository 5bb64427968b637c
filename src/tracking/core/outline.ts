import type { Place } from './flow.ts';
import { type Plane, sampleAt } from './plane.ts';
import { solveSymmetric } from './solve.ts';

/** Where a ray from the middle leaves the dot. */
interface Exit {
  readonly angle: number;
  readonly distance: number;
  /** Pixels from a quarter to three quarters of the change: large where there is no edge. */
  readonly blur: number;
}

const RAYS = 48;
const STEP = 0.25;

/**
 * Where the grey passes half between inside and outside, along one ray; null where it does not. The
 * outside is this ray's own: a dot at the edge of a limb has cloth on one side and a wall on the other.
 */
const exitAlong = (
  plane: Plane,
  centre: Place,
  angle: number,
  radius: number,
  inside: number,
): Exit | null => {
  const [ux, uy] = [Math.cos(angle), Math.sin(angle)];
  const at = (r: number): number => sampleAt(plane, centre.x + r * ux, centre.y + r * uy);
  const outside = (at(1.4 * radius + 1) + at(1.55 * radius + 1.5)) / 2;
  const change = outside - inside;
  if (Math.abs(change) < 8) return null;
  const crossings: number[] = [];
  let before = (at(0) - inside) / change;
  for (let r = STEP; r <= 1.6 * radius + 2; r += STEP) {
    const now = (at(r) - inside) / change;
    for (const [n, level] of [0.25, 0.5, 0.75].entries())
      if (crossings.length === n && before < level && now >= level)
        crossings.push(r - STEP + (STEP * (level - before)) / (now - before));
    before = now;
  }
  const [quarter, half, most] = crossings;
  if (quarter === undefined || half === undefined || most === undefined) return null;
  return { angle, distance: half, blur: most - quarter };
};

const HARMONICS = 5;
const waves = (angle: number): number[] => [
  1,
  Math.cos(angle),
  Math.sin(angle),
  Math.cos(2 * angle),
  Math.sin(2 * angle),
];

const fitted = (exits: readonly Exit[]): number[] | null => {
  const normal = new Array<number>(HARMONICS * HARMONICS).fill(0);
  const right = new Array<number>(HARMONICS).fill(0);
  for (const { angle, distance } of exits) {
    const row = waves(angle);
    for (const [i, a] of row.entries()) {
      right[i] = (right[i] ?? 0) + a * distance;
      for (const [j, b] of row.entries())
        normal[i * HARMONICS + j] = (normal[i * HARMONICS + j] ?? 0) + a * b;
    }
  }
  return solveSymmetric(normal, right);
};

const median = (values: readonly number[]): number =>
  [...values].sort((a, b) => a - b)[values.length >> 1] ?? NaN;

export interface Outline {
  readonly centre: Place;
  readonly radius: number;
  /** The share of rays that found an edge, 0 to 1. */
  readonly share: number;
  /** Root mean square of how far the edge lies off the fitted round, pixels. */
  readonly rough: number;
  /** Half the difference of its long and its short radius, as a part of the radius. */
  readonly oval: number;
  readonly blur: number;
}

/**
 * The round that a dot's edge makes, from a guess on. Distance from the middle is fitted by a
 * constant (radius), one wave around (the middle lies elsewhere) and two waves around (seen aslant
 * or smeared): the middle moves until the one wave is gone. An even smear moves no middle.
 */
export const outlineOf = (plane: Plane, guess: Place, size: number): Outline | null => {
  let centre = guess;
  let radius = size;
  for (let round = 0; round < 8; round += 1) {
    const inside =
      [0, 1, 2, 3, 4, 5, 6, 7].reduce(
        (sum, k) => {
          const angle = (k * Math.PI) / 4;
          const reach = 0.35 * radius;
          return (
            sum +
            sampleAt(plane, centre.x + reach * Math.cos(angle), centre.y + reach * Math.sin(angle))
          );
        },
        sampleAt(plane, centre.x, centre.y),
      ) / 9;
    const found = Array.from({ length: RAYS }, (_, k) =>
      exitAlong(plane, centre, (2 * Math.PI * k) / RAYS, radius, inside),
    ).filter((exit) => exit !== null);
    if (found.length < RAYS / 2) return null;
    const usual = median(found.map(({ distance }) => distance));
    const kept = found.filter(({ distance }) => Math.abs(distance - usual) < 0.45 * usual);
    const wave = kept.length >= RAYS / 2 ? fitted(kept) : null;
    if (!wave) return null;
    const [mean = NaN, right = NaN, down = NaN, across = NaN, aslant = NaN] = wave;
    if (!(mean > 1) || Math.hypot(right, down) > mean) return null;
    centre = { x: centre.x + right, y: centre.y + down };
    radius = mean;
    if (Math.hypot(right, down) > 0.01 && round < 7) continue;
    const squares = kept.reduce((sum, { angle, distance }) => {
      const model = waves(angle).reduce((value, part, k) => value + part * (wave[k] ?? 0), 0);
      return sum + (distance - model) ** 2;
    }, 0);
    return {
      ...{ centre, radius, share: kept.length / RAYS },
      rough: Math.sqrt(squares / kept.length),
      oval: Math.hypot(across, aslant) / mean,
      blur: median(kept.map(({ blur }) => blur)),
    };
  }
  return null;
};

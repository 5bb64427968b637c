/** A place where a series passes a level. */
export interface Crossing {
  readonly at: number;
  readonly direction: 'up' | 'down';
}

/**
 * Where a series passes a level, by straight lines between neighbours. Nulls break it: nothing is
 * found across a gap. A value that lies on the level counts once, on the way it is passed.
 */
export const crossings = (
  at: readonly number[],
  values: readonly (number | null)[],
  level: number,
): readonly Crossing[] => {
  const found: Crossing[] = [];
  for (let i = 1; i < values.length; i += 1) {
    const a = values[i - 1];
    const b = values[i];
    const from = at[i - 1];
    const to = at[i];
    if (a === null || b === null || a === undefined || b === undefined) continue;
    if (from === undefined || to === undefined || a < level === b < level) continue;
    const place = from + ((level - a) / (b - a)) * (to - from);
    found.push({ at: place, direction: b > a ? 'up' : 'down' });
  }
  return found;
};

/** Vertex of the parabola through three points at even distances around the middle one. */
export const parabolaTop = (
  middle: number,
  step: number,
  values: readonly [number, number, number],
): { readonly at: number; readonly value: number } | null => {
  const [before, top, after] = values;
  const bend = before - 2 * top + after;
  if (!Number.isFinite(bend) || bend === 0) return null;
  const shift = (before - after) / (2 * bend);
  return { at: middle + shift * step, value: top - ((before - after) * shift) / 4 };
};

import { median } from './robust.ts';

const LEAST_BANDWIDTH_MS = 150;
const GAPS = 2.5;
const LEAST_POINTS = 4;

/** Tricube: 1 in the middle, 0 from one bandwidth on. */
const tricube = (distance: number): number =>
  distance >= 1 ? 0 : (1 - Math.abs(distance) ** 3) ** 3;

/** Half-width of the window, ms: 150, or two and a half times the usual gap. */
export const bandwidthOf = (times: readonly number[]): number => {
  const gaps = times.slice(1).map((time, i) => time - (times[i] ?? time));
  return Math.max(LEAST_BANDWIDTH_MS, GAPS * (median(gaps) ?? 0));
};

/**
 * At each time the value of the straight line fitted to its neighbours, for a series that is sparse
 * or uneven. A window with fewer than four points is widened to the four nearest; fewer than four
 * values come back as they are. At the edges the window is one-sided. Gaps are cut before.
 */
export const localLinear = (
  times: readonly number[],
  values: readonly number[],
): readonly number[] => {
  if (values.length < LEAST_POINTS) return values;
  const bandwidth = bandwidthOf(times);
  return times.map((at, index) => {
    const sorted = times.map((time) => Math.abs(time - at)).sort((a, b) => a - b);
    // the fourth nearest lies inside the window, not on its edge where the weight is nought
    const reach = Math.max(bandwidth, (sorted[LEAST_POINTS - 1] ?? 0) * 1.001);
    let [w0, w1, w2, y0, y1] = [0, 0, 0, 0, 0];
    for (const [i, time] of times.entries()) {
      const x = time - at;
      const w = tricube(Math.abs(x) / reach);
      const y = values[i] ?? NaN;
      w0 += w;
      w1 += w * x;
      w2 += w * x * x;
      y0 += w * y;
      y1 += w * x * y;
    }
    const determinant = w0 * w2 - w1 * w1;
    return determinant > 1e-9 * w0 * w2
      ? (w2 * y0 - w1 * y1) / determinant
      : (values[index] ?? NaN);
  });
};

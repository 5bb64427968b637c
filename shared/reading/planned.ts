import { solveInPlace } from '#shared/course/linear.ts';
import { changeTerms, terms } from '#shared/course/rise-fit.ts';
import type { Degrees } from '#shared/geometry/units.ts';
import type { Gates } from '#shared/protocol/protocol.ts';

/** A frame as the fit would weigh it. */
export interface PlannedFrame {
  readonly lift: Degrees;
  /** 1/degrees². */
  readonly weight: number;
}

const SIZE = 4;
/** Keeps the plan solvable where frames leave a term undetermined; as in the fit itself. */
const RIDGE = [1e-9, 1e-7, 1e-7, 1e-5] as const;

/**
 * Variance of the change from gate to gate that frames with these lifts and weights would have, degrees²:
 * known before a single mark is placed. Null where they carry no fit.
 */
export const plannedVariance = (frames: readonly PlannedFrame[], gates: Gates): number | null => {
  const plain = new Float64Array(SIZE * SIZE);
  for (const { lift, weight } of frames) {
    const x = terms(lift, gates);
    for (let i = 0; i < SIZE; i += 1)
      for (let j = 0; j < SIZE; j += 1)
        plain[i * SIZE + j] = (plain[i * SIZE + j] ?? 0) + weight * (x[i] ?? 0) * (x[j] ?? 0);
  }
  const ridged = Float64Array.from(plain);
  for (let i = 0; i < SIZE; i += 1)
    ridged[i * (SIZE + 1)] = (ridged[i * (SIZE + 1)] ?? 0) + (RIDGE[i] ?? 0);
  const answer = Float64Array.from(changeTerms(gates));
  if (!solveInPlace(ridged, answer, SIZE, 1)) return null;
  let variance = 0;
  for (let i = 0; i < SIZE; i += 1)
    for (let j = 0; j < SIZE; j += 1)
      variance += (answer[i] ?? NaN) * (answer[j] ?? NaN) * (plain[i * SIZE + j] ?? NaN);
  return Number.isFinite(variance) && variance > 0 ? variance : null;
};

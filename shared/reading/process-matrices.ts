import { gatedCovariance, turnCovariance } from '#shared/course/turn-process.ts';
import type { Gates } from '#shared/protocol/protocol.ts';
import { CONSTANTS } from '#shared/measures/constants.ts';
import type { SeenLift } from './process-frames.ts';

/** What is believed of one segment before anything is seen, degrees² of change per 30° of lift. */
export interface SegmentBelief {
  /** Variance of the person's true part of the turn. */
  readonly own: number;
  /** Of the slip of skin or strap: what all reps share, and what differs from rep to rep. */
  readonly slipShared: number;
  readonly slipPerRep: number;
  /** Variance of true turn between reps. */
  readonly perRep: number;
}

/** Skin that slips by so much (a standard deviation, degrees): a part alike in all reps, a part in each its own. */
export const slipBelief = (slip: number): Pick<SegmentBelief, 'slipShared' | 'slipPerRep'> => ({
  slipShared: CONSTANTS.slipShared.value * slip ** 2,
  slipPerRep: (1 - CONSTANTS.slipShared.value) * slip ** 2,
});

export interface Belief {
  readonly thigh: SegmentBelief;
  readonly pelvis: SegmentBelief;
  /** Covariance of both parts: of the person's turn, and of what differs between reps. */
  readonly across: { readonly own: number; readonly perRep: number };
  /** How much of the turn's variance belongs to a turn between the gates alone. */
  readonly gated: number;
  /** Variance of the whole body's turn over the foot: outward for one part, inward for the other. */
  readonly wholeBody: number;
  /** Variance of where a rep's quiet stance lies against its rise, degrees². */
  readonly stance: number;
}

/** Marks' own scatter against the assumed, and the zero's variance per rep, degrees². */
export interface Scatter {
  readonly factor: number;
  readonly zeroThigh: readonly number[];
  readonly zeroPelvis: readonly number[];
}

/** Degrees of turn per degree of lift. */
export interface Slopes {
  readonly thigh: number;
  readonly pelvis: number;
}

/** Symmetric 2n × 2n in one array: thigh parts first, then pelvis parts, in the order of `seen`. */
const filled = (
  seen: readonly SeenLift[],
  cell: (
    a: SeenLift,
    b: SeenLift,
  ) => { readonly thigh: number; readonly pelvis: number; readonly across: number },
): Float64Array => {
  const n = seen.length;
  const size = 2 * n;
  const matrix = new Float64Array(size * size);
  const set = (i: number, j: number, value: number): void => {
    matrix[i * size + j] = value;
    matrix[j * size + i] = value;
  };
  for (const [i, a] of seen.entries())
    for (const [j, b] of seen.slice(0, i + 1).entries()) {
      const { thigh, pelvis, across } = cell(a, b);
      set(i, j, thigh);
      set(n + i, n + j, pelvis);
      set(i, n + j, across);
      set(j, n + i, across);
    }
  return matrix;
};

/** Covariance of everything but the errors of single frames, degrees². */
export const believedCovariance = (
  seen: readonly SeenLift[],
  { thigh, pelvis, across, gated, wholeBody, stance }: Belief,
  { zeroThigh, zeroPelvis }: Scatter,
  { from, to }: Gates,
): Float64Array => {
  const betweenGates = gatedCovariance(from, to);
  const curve = ({ own, slipShared, slipPerRep, perRep }: SegmentBelief, same: number): number =>
    own + slipShared + same * (slipPerRep + perRep + wholeBody);
  return filled(seen, (a, b) => {
    const k = turnCovariance(a.lift, b.lift);
    const same = a.rep === b.rep ? 1 : 0;
    // skin and body move smoothly; the turn itself may begin and end at the gates
    const gates = gated * (betweenGates(a.lift, b.lift) - k);
    const turning = ({ own, perRep }: Pick<SegmentBelief, 'own' | 'perRep'>): number =>
      own + same * perRep;
    return {
      thigh:
        k * curve(thigh, same) + gates * turning(thigh) + same * (stance + (zeroThigh[a.rep] ?? 0)),
      pelvis:
        k * curve(pelvis, same) +
        gates * turning(pelvis) +
        same * (stance + (zeroPelvis[a.rep] ?? 0)),
      across: -k * same * wholeBody + (k + gates) * turning(across),
    };
  });
};

/**
 * Covariance of the errors of single frames, degrees². Marks by hand err each for itself; tracked
 * ones keep their error for a while; the clocks of two tied clips are off for all frames of a rep alike. An
 * error of the lift shows as one of the turn where the turn is steep.
 */
export const frameCovariance = (
  seen: readonly SeenLift[],
  factor: number,
  slopes: Slopes,
): Float64Array =>
  filled(seen, (a, b) => {
    const alone = a === b ? 1 : 0;
    const hanging =
      a.tracked && b.tracked && a.rep === b.rep
        ? Math.exp(-Math.abs(a.time - b.time) / CONSTANTS.trackedFor.value)
        : alone;
    const tie =
      a.rep === b.rep ? a.byTie.reduce((sum, shift, k) => sum + shift * (b.byTie[k] ?? NaN), 0) : 0;
    const lift = alone * a.liftVariance + tie;
    return {
      thigh:
        factor * hanging * Math.sqrt(a.thighVariance * b.thighVariance) + lift * slopes.thigh ** 2,
      pelvis:
        factor * hanging * Math.sqrt(a.pelvisVariance * b.pelvisVariance) +
        lift * slopes.pelvis ** 2,
      across: tie * slopes.thigh * slopes.pelvis,
    };
  });

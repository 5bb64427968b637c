import { drawnSpread, type RiseDraws } from '#shared/course/rise-draws.ts';
import { type Beta, changeTerms, dot, preTerms, type RiseFit } from '#shared/course/rise-fit.ts';
import { changeVariance } from '#shared/course/turn-process.ts';
import { type Degrees, degrees } from '#shared/geometry/units.ts';
import { CONSTANTS } from '#shared/measures/constants.ts';
import type { Gates } from '#shared/protocol/protocol.ts';

const REP = CONSTANTS.repSpread.value;
const THIGH = CONSTANTS.thighSpread.value;

/** One usable rep, fitted and drawn. */
export interface FittedRep {
  readonly fit: RiseFit;
  readonly draws: RiseDraws;
  /** Changes of the turn and its parts from gate to gate, and of 30° to the lower gate, with random uncertainty. */
  readonly d: Degrees;
  readonly u: Degrees;
  readonly dPelvis: Degrees;
  readonly uPelvis: Degrees;
  readonly dThigh: Degrees;
  readonly uThigh: Degrees;
  readonly pre: Degrees;
  readonly uPre: Degrees;
}

const NOTHING: Beta = [0, 0, 0, 0];

/** Null where the draws carry no spread: marks that coincide. */
export const fittedRep = (fit: RiseFit, draws: RiseDraws, gates: Gates): FittedRep | null => {
  const spread = (thigh: Beta, pelvis: Beta): Degrees =>
    degrees(fit.sFit * drawnSpread(draws, [...thigh, ...pelvis]));
  const change = changeTerms(gates);
  const pre = preTerms(gates);
  const rep: FittedRep = {
    fit,
    draws,
    d: degrees(dot(change, fit.turn)),
    u: spread(change, change),
    dPelvis: degrees(dot(change, fit.pelvis)),
    uPelvis: spread(NOTHING, change),
    dThigh: degrees(dot(change, fit.thigh)),
    uThigh: spread(change, NOTHING),
    pre: degrees(dot(pre, fit.turn)),
    uPre: spread(pre, pre),
  };
  const { d, u, uPelvis, uThigh, uPre } = rep;
  return Number.isFinite(d + u + uPelvis + uThigh + rep.pre + uPre) ? rep : null;
};

/** The reps together: random parts only. */
export interface Pooled {
  readonly shares: readonly number[];
  readonly d: Degrees;
  readonly uR: Degrees;
  readonly nuR: number;
  readonly dPelvis: Degrees;
  readonly uPelvis: Degrees;
  readonly dThigh: Degrees;
  readonly uThigh: Degrees;
  readonly pre: Degrees;
  readonly uPre: Degrees;
  /** How much of the thigh part counts; 1 without the assumption. */
  readonly lambda: number;
}

/** Shares ∝ 1/(u² + 1.5²): true turn differs from rep to rep, so none may outweigh all others. */
export const sharesOf = (uncertainties: readonly Degrees[]): readonly number[] => {
  const weights = uncertainties.map((u) => 1 / (u * u + REP * REP));
  const sum = weights.reduce((a, b) => a + b, 0);
  return weights.map((weight) => weight / sum);
};

/** Widens where the reps differ more than their errors explain; never narrows. */
export const disagreement = (
  changes: readonly Degrees[],
  uncertainties: readonly Degrees[],
  shares: readonly number[],
): number => {
  const n = changes.length;
  if (n < 2) return 1;
  const mean = changes.reduce((sum, d, i) => sum + d * (shares[i] ?? 0), 0);
  const chi2 = changes.reduce(
    (sum, d, i) => sum + (d - mean) ** 2 / ((uncertainties[i] ?? NaN) ** 2 + 2 * REP * REP),
    0,
  );
  return Math.max(1, (3 + chi2) / (3 + n - 1));
};

/** At least one rep. */
export const pool = (
  reps: readonly FittedRep[],
  thighTurnsLittle: boolean,
  gates: Gates,
): Pooled => {
  const uncertainties = reps.map((rep) => rep.u);
  const shares = sharesOf(uncertainties);
  const mean = (read: (rep: FittedRep) => number): number =>
    reps.reduce((sum, rep, i) => sum + (shares[i] ?? 0) * read(rep), 0);
  const squares = (read: (rep: FittedRep) => number): number =>
    reps.reduce((sum, rep, i) => sum + ((shares[i] ?? 0) * read(rep)) ** 2, 0);
  const widened = disagreement(
    reps.map((rep) => rep.d),
    uncertainties,
    shares,
  );
  const dPelvis = mean((rep) => rep.dPelvis);
  const dThigh = mean((rep) => rep.dThigh);
  const thighVariance = squares((rep) => rep.uThigh) + (thighTurnsLittle ? REP * REP : 0);
  const believed = THIGH * THIGH * changeVariance(gates.to - gates.from);
  const lambda = thighTurnsLittle ? believed / (believed + thighVariance) : 1;
  const random = thighTurnsLittle
    ? squares((rep) => rep.uPelvis) + lambda * thighVariance
    : squares((rep) => rep.u);
  return {
    shares,
    d: degrees(dPelvis + lambda * dThigh),
    uR: degrees(Math.sqrt(random * widened)),
    nuR: reps.reduce((sum, rep) => sum + rep.fit.nu, 0),
    dPelvis: degrees(dPelvis),
    uPelvis: degrees(Math.sqrt(squares((rep) => rep.uPelvis))),
    dThigh: degrees(lambda * dThigh),
    uThigh: degrees(Math.sqrt(lambda * thighVariance)),
    pre: degrees(mean((rep) => rep.pre)),
    uPre: degrees(Math.sqrt(squares((rep) => rep.uPre))),
    lambda,
  };
};

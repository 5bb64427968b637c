import { drawnSpread, type RiseDraws } from '#shared/course/rise-draws.ts';
import { BEFORE, type Beta, dot, terms } from '#shared/course/rise-fit.ts';
import { type Degrees, degrees } from '#shared/geometry/units.ts';
import type { Gates } from '#shared/protocol/protocol.ts';
import type { CurvePoint } from './types.ts';

/** A marked frame carries the curve this far, degrees: from our model, no source. */
const REACH = 8;
const STEP = 1;

/** One rep's fit as it enters a drawn course. */
export interface DrawnFit {
  readonly thigh: Beta;
  readonly pelvis: Beta;
  readonly sFit: number;
  readonly draws: RiseDraws;
  /** Its share of the course: 1 for a rep alone. */
  readonly share: number;
  /** Lifts of the frames that carry weight. */
  readonly lifts: readonly Degrees[];
}

/** How uncertain the change at the upper gate is: random and systematic part. */
export interface BandWidths {
  readonly uR: Degrees;
  readonly uS: Degrees;
  /** How much of the thigh part counts; 1 without the assumption. */
  readonly lambda: number;
}

const scaled = (beta: Beta, by: number): Beta => [
  beta[0] * by,
  beta[1] * by,
  beta[2] * by,
  beta[3] * by,
];

const minus = (a: Beta, b: Beta): Beta => [a[0] - b[0], a[1] - b[1], a[2] - b[2], a[3] - b[3]];

/** Grows from nothing at the lower gate to all of it at the upper one and at 30°, and stays so beyond. */
const grown = (lift: number, { from, to }: Gates): number =>
  Math.min(1, lift >= from ? (lift - from) / (to - from) : (from - lift) / (from - BEFORE));

/** Random spread of the curve's change from the lower gate: each rep's draws, added in quadrature. */
const randomSpread = (
  fits: readonly DrawnFit[],
  lift: Degrees,
  lambda: number,
  gates: Gates,
): number => {
  const change = minus(terms(lift, gates), terms(gates.from, gates));
  return Math.hypot(
    ...fits.map(
      ({ draws, sFit, share }) =>
        share * sFit * drawnSpread(draws, [...scaled(change, lambda), ...change]),
    ),
  );
};

/** A course from its turn and its standard uncertainty at each whole degree between marked lifts. */
export const bandOf = (
  lifts: readonly Degrees[],
  at: (lift: Degrees) => { readonly turn: number; readonly u: number },
): readonly CurvePoint[] => {
  if (lifts.length === 0) return [];
  const high = Math.floor(Math.max(...lifts));
  const curve: CurvePoint[] = [];
  for (let whole = Math.ceil(Math.min(...lifts)); whole <= high; whole += STEP) {
    const lift = degrees(whole);
    const { turn, u } = at(lift);
    curve.push({
      lift,
      turn: degrees(turn),
      low: degrees(turn - 1.96 * u),
      high: degrees(turn + 1.96 * u),
      carried: lifts.some((each) => Math.abs(each - lift) <= REACH),
    });
  }
  return curve;
};

/**
 * The drawn course: weighted mean of the fits. Its band (95 %, under our error model) judges the
 * change from the lower gate: it is closed there, and at the upper one exactly d ± 1.96 u around
 * the value at the lower.
 */
export const courseCurve = (
  fits: readonly DrawnFit[],
  { uR, uS, lambda }: BandWidths,
  gates: Gates,
): readonly CurvePoint[] => {
  const scale = uR / randomSpread(fits, gates.to, lambda, gates);
  if (!Number.isFinite(scale)) return [];
  return bandOf(
    fits.flatMap((fit) => fit.lifts),
    (lift) => {
      const x = terms(lift, gates);
      return {
        turn: fits.reduce(
          (sum, fit) => sum + fit.share * (lambda * dot(x, fit.thigh) + dot(x, fit.pelvis)),
          0,
        ),
        u: Math.hypot(scale * randomSpread(fits, lift, lambda, gates), uS * grown(lift, gates)),
      };
    },
  );
};

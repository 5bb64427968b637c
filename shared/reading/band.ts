import { drawnSpread, type RiseDraws } from '#shared/course/rise-draws.ts';
import { type Beta, dot, terms } from '#shared/course/rise-fit.ts';
import { type Degrees, degrees } from '#shared/geometry/units.ts';
import { CONSTANTS } from '#shared/measures/constants.ts';
import type { CurvePoint } from './types.ts';

const FROM = degrees(CONSTANTS.gateFrom.value);
const TO = degrees(CONSTANTS.gateTo.value);
const BEFORE = 30;
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

/** How uncertain the change at 90° is: random and systematic part. */
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

/** Grows from nothing at 60° to all of it at 90° and at 30°, and stays so beyond. */
const grown = (lift: number): number =>
  Math.min(1, lift >= FROM ? (lift - FROM) / (TO - FROM) : (FROM - lift) / (FROM - BEFORE));

/** Random spread of the curve's change from 60° to a lift: each rep's draws, added in quadrature. */
const randomSpread = (fits: readonly DrawnFit[], lift: Degrees, lambda: number): number => {
  const change = minus(terms(lift), terms(FROM));
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
 * change from 60°: it is closed there, and at 90° exactly d ± 1.96 u around the value at 60°.
 */
export const courseCurve = (
  fits: readonly DrawnFit[],
  { uR, uS, lambda }: BandWidths,
): readonly CurvePoint[] => {
  const scale = uR / randomSpread(fits, TO, lambda);
  if (!Number.isFinite(scale)) return [];
  return bandOf(
    fits.flatMap((fit) => fit.lifts),
    (lift) => {
      const x = terms(lift);
      return {
        turn: fits.reduce(
          (sum, fit) => sum + fit.share * (lambda * dot(x, fit.thigh) + dot(x, fit.pelvis)),
          0,
        ),
        u: Math.hypot(scale * randomSpread(fits, lift, lambda), uS * grown(lift)),
      };
    },
  );
};

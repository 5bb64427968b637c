import type { TrialSet } from '#shared/evaluate/trial.ts';
import type { Outcome } from './outcome.ts';
import { EARLY } from './plan.ts';

/** How often something happened. */
export interface Count {
  readonly hits: number;
  readonly of: number;
}

const countOf = (outcomes: readonly Outcome[], hit: (outcome: Outcome) => boolean): Count => ({
  hits: outcomes.filter(hit).length,
  of: outcomes.length,
});

/** Power at one size of an early turn, with one or three reps, 1,080 lines marked to 3 px. */
export interface Power {
  readonly size: number;
  readonly reps: number;
  readonly found: Count;
  /** 1.96 standard uncertainties of no turn, degrees: the method's 'smallest change'. */
  readonly smallestChange: number | null;
}

/** One tenth of the stated probability of an early turn, against how often it was one. */
export interface Tenth {
  readonly from: number;
  readonly stated: number;
  readonly true: Count;
}

/** All figures of one landmark set. */
export interface SetTables {
  readonly set: TrialSet;
  /** Early calls at no turn: independent marks and the assumed artefact, then all others. */
  readonly falseEarly: { readonly assumed: Count; readonly harder: Count };
  /** Early calls at an expected turn. */
  readonly wrongWay: Count;
  readonly expectedFound: Count;
  readonly cannotTell: Count;
  readonly notMeasurable: Count;
  readonly power: readonly Power[];
  /** Trials of any size: as assumed, and harder. */
  readonly calibration: { readonly assumed: readonly Tenth[]; readonly harder: readonly Tenth[] };
  /** Root mean square of (found − true)/stated uncertainty: 1 where it is honest. */
  readonly spread: { readonly assumed: number; readonly harder: number };
}

const early = ({ code }: Outcome): boolean => code === 'early-turn-out';

/** Degrees above which a change counts as an early turn: the rule's own line. */
const CLEAR = 1;

const tenths = (outcomes: readonly Outcome[]): readonly Tenth[] =>
  Array.from({ length: 10 }, (_, i): Tenth => {
    const within = outcomes.flatMap((outcome) => {
      const { pEarly } = outcome;
      const here = pEarly !== null && Math.min(9, Math.floor(pEarly * 10)) === i;
      return here ? [{ outcome, pEarly }] : [];
    });
    return {
      from: i / 10,
      stated: within.reduce((sum, { pEarly }) => sum + pEarly / within.length, 0),
      true: countOf(
        within.map(({ outcome }) => outcome),
        ({ plan }) => plan.change > CLEAR,
      ),
    };
  });

const spread = (outcomes: readonly Outcome[]): number => {
  const squares = outcomes.flatMap(({ d, uC, plan }) =>
    d === null || uC === null ? [] : [((d - plan.change) / uC) ** 2],
  );
  return Math.sqrt(squares.reduce((sum, square) => sum + square / squares.length, 0));
};

const powerOf = (outcomes: readonly Outcome[], size: number, reps: number): Power => {
  const these = outcomes.filter(
    ({ plan }) => plan.truth === 'early' && plan.change === size && plan.reps === reps,
  );
  const known = these.flatMap(({ uC0 }) => uC0 ?? []);
  return {
    size,
    reps,
    found: countOf(these, early),
    smallestChange:
      known.length === 0 ? null : known.reduce((sum, u) => sum + (1.96 * u) / known.length, 0),
  };
};

export const tablesOf = (all: readonly Outcome[], set: TrialSet): SetTables => {
  const outcomes = all.filter((outcome) => outcome.set === set);
  const of = (truth: Outcome['plan']['truth']): readonly Outcome[] =>
    outcomes.filter(({ plan }) => plan.truth === truth);
  const assumed = outcomes.filter(({ plan }) => plan.assumed);
  const harder = outcomes.filter(({ plan }) => !plan.assumed);
  const both = (
    read: (some: readonly Outcome[]) => readonly Tenth[],
  ): SetTables['calibration'] => ({
    assumed: read(assumed.filter(({ plan }) => plan.truth === 'any')),
    harder: read(harder.filter(({ plan }) => plan.truth === 'any')),
  });
  const none = (some: readonly Outcome[]): Count =>
    countOf(
      some.filter(({ plan }) => plan.truth === 'none'),
      early,
    );
  return {
    set,
    falseEarly: { assumed: none(assumed), harder: none(harder) },
    wrongWay: countOf(of('expected'), early),
    expectedFound: countOf(of('expected'), ({ code }) => code === 'expected-turn-in'),
    cannotTell: countOf(outcomes, ({ code }) => code === 'cannot-tell'),
    notMeasurable: countOf(outcomes, ({ code }) => code === 'not-measurable'),
    power: [1, 3].flatMap((reps) => EARLY.map((size) => powerOf(outcomes, size, reps))),
    calibration: both(tenths),
    spread: { assumed: spread(assumed), harder: spread(harder) },
  };
};

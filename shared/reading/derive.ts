import { DRAWS } from '#shared/course/rise-draws.ts';
import { dot, terms } from '#shared/course/rise-fit.ts';
import { degrees } from '#shared/geometry/units.ts';
import type { LandmarkSetId } from '#shared/landmarks/types.ts';
import { SYSTEMATIC } from '#shared/measures/constants.ts';
import { assess, type Assessed } from './assess.ts';
import { courseCurve } from './band.ts';
import { canonicalText } from './canonical.ts';
import { figuresOf, type Systematic } from './figures.ts';
import type { UsedRep } from './fit-rep.ts';
import { onsetOf } from './onset.ts';
import { pool } from './pool.ts';
import { drawnFit, repResult } from './rep-result.ts';
import { decide, decideWithoutRep } from './rule.ts';
import { settleOf } from './settle.ts';
import { hexOf, sha256Words } from './sha256.ts';
import type { ReadingInput, ReadingResult } from './types.ts';
import { hollowFrames, placedWarnings } from './warnings.ts';

/** Lift from which a return of the turn past 90° is described. */
const RETURN_FROM = 100;

/** Systematic error of a set: the assumed one, or the practice's own u with the assumed growth. */
const systematicOf = (
  { ownSystematic }: ReadingInput,
  set: LandmarkSetId,
  thighTurnsLittle: boolean,
): Systematic => {
  const assumed = SYSTEMATIC[thighTurnsLittle ? 'belt+assumption' : set];
  return ownSystematic?.set === set && !thighTurnsLittle
    ? { u: ownSystematic.u, q: assumed.q }
    : assumed;
};

/** Change of the weighted fit from 90° to the top, over the reps that reach 100°. */
const returnPast90 = (
  used: readonly UsedRep[],
  shares: readonly number[],
  lambda: number,
): ReadingResult['returnPast90'] => {
  const high = used.flatMap(({ course, fitted }, i) =>
    course.fMax !== null && course.fMax >= RETURN_FROM
      ? [{ fMax: course.fMax, fit: fitted.fit, share: shares[i] ?? 0 }]
      : [],
  );
  const sum = high.reduce((total, { share }) => total + share, 0);
  if (sum === 0) return null;
  const to = high.reduce((total, { fMax, share }) => total + (fMax * share) / sum, 0);
  const past = (beta: Parameters<typeof dot>[0]): number =>
    dot(terms(degrees(to)), beta) - dot(terms(degrees(90)), beta);
  const change = high.reduce(
    (total, { fit, share }) =>
      total + ((past(fit.pelvis) + lambda * past(fit.thigh)) * share) / sum,
    0,
  );
  return { to: degrees(to), change: degrees(change) };
};

/** Reps that could have counted: line 1 looks at their lifts. */
const candidates = (reps: readonly Assessed[]): readonly Assessed[] =>
  reps.filter(
    ({ faults }) =>
      !faults.some(
        ({ code }) =>
          code === 'excluded' || code === 'other-side' || code === 'view-cannot-show-turn',
      ),
  );

/**
 * The reading of one support side of one visit. Deterministic: the draws are seeded by the input
 * itself. Never throws for bad marks, times or missing inputs: they come back as typed faults.
 * `runs` of the Monte Carlo part: readings that are kept use the default.
 */
export const deriveReading = (input: ReadingInput, runs: number = DRAWS): ReadingResult => {
  const hash = sha256Words(canonicalText(input));
  const seed = hash[0] ?? 0;
  const { set, reps } = assess(input, seed, runs);
  const used = reps.flatMap((rep) => rep.used ?? []);
  const head = { engine: input.engine, inputHash: hexOf(hash), supportSide: input.supportSide };
  const courses = reps.flatMap(({ shown, faults }) =>
    shown && !faults.some(({ code }) => code === 'excluded') ? [shown] : [],
  );
  if (set === null) {
    const decision = decideWithoutRep(candidates(reps).map(({ shown }) => shown?.fMax ?? null));
    return {
      ...head,
      ...decision,
      set,
      thighTurnsLittle: false,
      provisional: courses.some((course) => hollowFrames(course) > 0),
      figures: null,
      onset: null,
      returnPast90: null,
      course: [],
      reps: reps.map((rep) => repResult(rep, null)),
      warnings: placedWarnings(courses, false),
      settle: settleOf(decision, reps, null),
    };
  }
  const thighTurnsLittle = input.thighTurnsLittle && set === 'belt';
  const systematic = systematicOf(input, set, thighTurnsLittle);
  const pooled = pool(
    used.map(({ fitted }) => fitted),
    thighTurnsLittle,
  );
  const figures = figuresOf(pooled, used.length, systematic, thighTurnsLittle);
  const decision = decide(figures);
  const shareOf = new Map(used.map((rep, i) => [rep, pooled.shares[i] ?? 0]));
  const usedCourses = used.map(({ course }) => course);
  return {
    ...head,
    ...decision,
    set,
    thighTurnsLittle,
    provisional: usedCourses.some((course) => hollowFrames(course) > 0),
    figures,
    onset:
      decision.code === 'early-turn-out'
        ? onsetOf(used.map(({ data, fitted }) => ({ data, sFit: fitted.fit.sFit })))
        : null,
    returnPast90: returnPast90(used, pooled.shares, pooled.lambda),
    course: courseCurve(
      used.map((rep) => drawnFit(rep, shareOf.get(rep) ?? 0)),
      { uR: figures.uR, uS: figures.uS, lambda: pooled.lambda },
    ),
    reps: reps.map((rep) =>
      repResult(rep, rep.used && { share: shareOf.get(rep.used) ?? 0, systematic }),
    ),
    warnings: placedWarnings(usedCourses, thighTurnsLittle),
    settle: settleOf(decision, reps, { set, figures, systematic }),
  };
};

import { DRAWS } from '#shared/course/rise-draws.ts';
import { type Degrees, degrees } from '#shared/geometry/units.ts';
import type { LandmarkSetId } from '#shared/landmarks/types.ts';
import { SYSTEMATIC } from '#shared/measures/constants.ts';
import { gatesOf, rulesOf } from '#shared/protocol/protocol.ts';
import { assess, type Assessed } from './assess.ts';
import { canonicalInputs } from './canonical-inputs.ts';
import { figuresOf, type Systematic } from './figures.ts';
import type { EngineVersion } from './engine.ts';
import type { UsedRep } from './fit-rep.ts';
import { joinByFit } from './join-by-fit.ts';
import { joinByProcess } from './join-by-process.ts';
import { joinByTwoProcesses } from './join-by-two-processes.ts';
import type { Joined, Joining } from './joined.ts';
import { onsetOf } from './onset.ts';
import { repResult } from './rep-result.ts';
import { decide, decideWithoutRep } from './rule.ts';
import { settleOf } from './settle.ts';
import { hexOf, sha256Words } from './sha256.ts';
import type { ReadingInput, ReadingResult } from './types.ts';
import { hollowFrames, placedWarnings } from './warnings.ts';

/** So far over the upper gate a return of the turn is described. */
const RETURN_ABOVE = 10;

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

/** Change from the upper gate to the top, over the reps that go far enough past it. */
const returnPast90 = (
  used: readonly UsedRep[],
  { pooled: { shares }, past90 }: Joined,
  gate: Degrees,
): ReadingResult['returnPast90'] => {
  const high = used.map(({ course: { fMax } }, i) =>
    fMax !== null && fMax >= gate + RETURN_ABOVE ? { fMax, share: shares[i] ?? 0 } : null,
  );
  const sum = high.reduce((total, rep) => total + (rep?.share ?? 0), 0);
  if (sum === 0) return null;
  const own = high.map((rep) => (rep?.share ?? 0) / sum);
  const to = degrees(high.reduce((total, rep, i) => total + (rep?.fMax ?? 0) * (own[i] ?? 0), 0));
  return { to, change: past90(to, own) };
};

const joinUnequal = (joining: Joining): Joined =>
  (joining.set === 'belt' ? joinByProcess(joining) : null) ?? joinByFit(joining);

/**
 * Engine 2 differs with a belt pointer alone, where pelvis and femur are seen unequally well. Engine 3
 * reads bare landmarks so too. With both pointers, and under the assumption, it finds fewer early turns
 * for its fewer false calls, and what was stays.
 */
const JOIN: Readonly<Record<EngineVersion, (joining: Joining) => Joined>> = {
  1: joinByFit,
  2: joinUnequal,
  3: (joining) =>
    (joining.set === 'belt+thigh' || joining.thighTurnsLittle
      ? null
      : joinByTwoProcesses(joining)) ?? joinUnequal(joining),
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
  const hash = sha256Words(canonicalInputs(input));
  const seed = hash[0] ?? 0;
  const { set, reps } = assess(input, seed, runs);
  const used = reps.flatMap((rep) => rep.used ?? []);
  const rules = rulesOf(input.rules);
  const gates = gatesOf(rules);
  const head = {
    engine: input.engine,
    rules,
    inputHash: hexOf(hash),
    supportSide: input.supportSide,
  };
  const courses = reps.flatMap(({ shown, faults }) =>
    shown && !faults.some(({ code }) => code === 'excluded') ? [shown] : [],
  );
  if (set === null) {
    const highest = candidates(reps).map(({ shown }) => shown?.fMax ?? null);
    const decision = decideWithoutRep(highest, rules);
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
      warnings: placedWarnings(courses, { thighTurnsLittle: false, rules }),
      settle: settleOf(decision, reps, null, rules),
    };
  }
  const thighTurnsLittle = input.thighTurnsLittle && set === 'belt';
  const systematic = systematicOf(input, set, thighTurnsLittle);
  const joined = JOIN[input.engine]({ used, set, thighTurnsLittle, systematic, gates });
  const { pooled } = joined;
  const figures = figuresOf(pooled, joined.uncertain, {
    thighTurnsLittle,
    gates,
    alternative: joined.twice,
  });
  const decision = decide(figures, rules);
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
    returnPast90: returnPast90(used, joined, gates.to),
    course: joined.course(figures),
    reps: reps.map((rep) =>
      repResult(rep, rep.used && { share: shareOf.get(rep.used) ?? 0, systematic, gates }),
    ),
    warnings: placedWarnings(usedCourses, { thighTurnsLittle, rules }),
    settle: settleOf(decision, reps, { engine: input.engine, set, figures, systematic }, rules),
  };
};

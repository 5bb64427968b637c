import type { LandmarkSetId } from '#shared/landmarks/types.ts';
import { CONSTANTS, SYSTEMATIC } from '#shared/measures/constants.ts';
import type { Joined, Joining } from './joined.ts';
import { joinedProcess } from './joined-process.ts';
import { turnProcess, type TurnProcess } from './process.ts';
import { seenLifts } from './process-frames.ts';
import { type Belief, type SegmentBelief, slipBelief } from './process-matrices.ts';
import { quietScatter, type Scattered } from './quiet-scatter.ts';
import { riseScatter, scatterOf } from './rise-scatter.ts';

const PRIOR2 = CONSTANTS.prior.value ** 2;
const REP2 = CONSTANTS.repSpread.value ** 2;
const TWICE = 2;

const pelvisSlip = (set: LandmarkSetId): number =>
  set === 'bare' ? CONSTANTS.outlineSlip.value : CONSTANTS.beltPointerSlip.value;

/** Thigh and pelvis do any share of a turn, one as likely as another: the second moments of that. */
const EACH = 1 / 3;
const ACROSS = 1 / 6;

/** `size`: of the slips, times what is assumed. */
const beliefOf = ({ set }: Joining, size: number): Belief => {
  const segment = (slip: number): SegmentBelief => ({
    own: PRIOR2 * EACH,
    ...slipBelief(size * slip),
    perRep: REP2 * EACH,
  });
  return {
    thigh: segment(CONSTANTS.kneeSlip.value),
    pelvis: segment(pelvisSlip(set)),
    across: { own: PRIOR2 * ACROSS, perRep: REP2 * ACROSS },
    gated: CONSTANTS.gated.value,
    wholeBody: CONSTANTS.wholeBody.value ** 2,
    stance: CONSTANTS.stanceSpread.value ** 2,
  };
};

/** What stands still is easier to mark than what moves, and counts no more. */
const noMoreThan = (free: number, all: Scattered): Scattered =>
  all.free <= free ? all : { squares: (all.squares * free) / all.free, free };

/** Chance of slips twice as large, from a chance of one in three and what the frames show. */
const chanceOfTwice = (once: TurnProcess, twice: TurnProcess): number => {
  const before = CONSTANTS.twiceTheSlip.value;
  const odds =
    (before / (1 - before)) * Math.exp(Math.min(50, twice.logLikelihood - once.logLikelihood));
  return odds / (1 + odds);
};

/**
 * Engine 3 with bare landmarks or a belt pointer alone: one Gaussian regression over the frames of all
 * reps. Marks' own error is learnt from the rise and the quiet stance together, and slips twice as
 * large as assumed are believed possible: probabilities count both, every other figure stands for what
 * is assumed. A practice that has measured its own slips knows their size. Null where the frames carry
 * no answer.
 */
export const joinByTwoProcesses = (joining: Joining): Joined | null => {
  const { used, set, systematic, gates } = joining;
  const measuredBy = systematic.u / SYSTEMATIC[set].u;
  const rise = riseScatter(used);
  const { scatter, nu } = scatterOf(used, rise, noMoreThan(rise.free, quietScatter(used)));
  const seen = used.flatMap((rep, at) => seenLifts(rep, at));
  const once = turnProcess(seen, beliefOf(joining, measuredBy), scatter, gates);
  const joined = once && joinedProcess(once, seen, joining, nu);
  if (!once || !joined || measuredBy !== 1) return joined;
  const twice = turnProcess(seen, beliefOf(joining, TWICE), scatter, gates);
  const other = twice && joinedProcess(twice, seen, joining, nu);
  if (!twice || !other) return joined;
  const { pooled, uncertain } = other;
  return { ...joined, twice: { pooled, uncertain, chance: chanceOfTwice(once, twice) } };
};

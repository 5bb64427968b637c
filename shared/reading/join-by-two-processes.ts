import type { LandmarkSetId } from '#shared/landmarks/types.ts';
import { CONSTANTS, SYSTEMATIC } from '#shared/measures/constants.ts';
import type { UsedRep } from './fit-rep.ts';
import type { Joined, Joining } from './joined.ts';
import { joinedProcess } from './joined-process.ts';
import { turnProcess, type TurnProcess } from './process.ts';
import { seenLifts } from './process-frames.ts';
import type { Belief, Scatter, SegmentBelief } from './process-matrices.ts';
import { quietScatter, type Scattered } from './quiet-scatter.ts';
import { LEAST_FACTOR, riseScatter } from './rise-scatter.ts';

const PRIOR2 = CONSTANTS.prior.value ** 2;
const REP2 = CONSTANTS.repSpread.value ** 2;
const PRIOR_FRAMES = 6;
const TWICE = 2;

const pelvisSlip = (set: LandmarkSetId): number =>
  set === 'bare' ? CONSTANTS.outlineSlip.value : CONSTANTS.beltPointerSlip.value;

/** Thigh and pelvis do any share of a turn, one as likely as another: the second moments of that. */
const EACH = 1 / 3;
const ACROSS = 1 / 6;

/** `size`: of the slips, times what is assumed. */
const beliefOf = ({ set }: Joining, size: number): Belief => {
  const segment = (slip: number): SegmentBelief => {
    const slip2 = (size * slip) ** 2;
    return {
      own: PRIOR2 * EACH,
      slipShared: CONSTANTS.slipShared.value * slip2,
      slipPerRep: (1 - CONSTANTS.slipShared.value) * slip2,
      perRep: REP2 * EACH,
    };
  };
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

const scatterOf = (
  used: readonly UsedRep[],
): { readonly scatter: Scatter; readonly nu: number } => {
  const rise = riseScatter(used);
  const quiet = noMoreThan(rise.free, quietScatter(used));
  const nu = PRIOR_FRAMES + rise.free + quiet.free;
  const factor = Math.max(LEAST_FACTOR, (PRIOR_FRAMES + rise.squares + quiet.squares) / nu);
  const zero = (read: (rep: UsedRep) => number | undefined): readonly number[] =>
    used.map((rep) => (read(rep) ?? 0) * (180 / Math.PI) ** 2 * factor);
  return {
    nu,
    scatter: {
      factor,
      zeroThigh: zero(({ course }) => course.setting.turnZero?.femurVariance),
      zeroPelvis: zero(({ course }) => course.setting.turnZero?.pelvisVariance),
    },
  };
};

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
  const { scatter, nu } = scatterOf(used);
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

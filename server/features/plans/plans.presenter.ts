import type { Tick } from '#shared/contracts/athlete-plan.ts';
import type {
  Finding,
  Plan as PlanShape,
  PlanItem as PlanItemShape,
  PlanState,
} from '#shared/contracts/plans.ts';
import { heldBackBy, type SafetyState, whyNotAllTheSame } from '#shared/plan/held-back.ts';
import { exerciseOf } from '#shared/plan/library.ts';
import { presentPerson } from '../accounts/accounts.presenter.ts';
import type { FindingOfSide } from './findings.ts';
import type { GivenPlan } from './given-plan.entity.ts';
import { stateOf } from './last-safety.ts';
import { isUndecided, missingOf } from './missing.ts';
import type { PlanPain } from './plan-answers.entity.ts';
import type { PlanItem } from './plan-item.entity.ts';
import type { Plan } from './plan.entity.ts';

export const presentFinding = ({
  basis,
  suggestion,
  hindrance,
  signedOff,
}: FindingOfSide): Finding => ({
  basis,
  suggestion:
    suggestion.kind === 'retest'
      ? suggestion
      : { ...suggestion, exercises: [...suggestion.exercises] },
  hindrance,
  signedOff,
});

const presentItem = (item: PlanItem, safety: SafetyState): PlanItemShape => {
  const { exercise, stage, side, sideConfirmed, dose, cue, decision } = item;
  const heldBack = heldBackBy(exerciseOf(exercise), safety.answers);
  return {
    exercise,
    stage,
    side,
    sideConfirmed,
    dose,
    cue,
    heldBack,
    mayNot: heldBack.length === 0 ? null : whyNotAllTheSame(heldBack, safety),
    undecided: isUndecided(item, safety),
    decision: decision ? { ...decision, answers: [...decision.answers] } : null,
  };
};

/** @param last what the athlete got last; null where nothing was given yet */
export const planStateOf = (
  version: number,
  last: { readonly planVersion: number; readonly stopped: boolean } | null,
): PlanState => {
  if (!last) return 'draft';
  if (last.stopped) return 'stopped';
  return last.planVersion === version ? 'given' : 'changed-since';
};

/** @param pain with `seenBy` loaded */
const presentPain = (pain: PlanPain): PlanShape['pain'][number] => ({
  id: pain.id,
  day: pain.day,
  level: pain.level,
  places: pain.places,
  which: pain.which ?? null,
  time: pain.time ?? null,
  exercise: pain.exercise ?? null,
  at: pain.at.toISOString(),
  seen:
    pain.seenBy && pain.seenAt
      ? { by: presentPerson(pain.seenBy.unwrap()), at: pain.seenAt.toISOString() }
      : null,
});

/** @param of with `plan.madeBy`, `given.by` and `pain.seenBy` loaded */
export const presentPlan = ({
  plan,
  ofVisit,
  items,
  given,
  pain,
  ticks,
  liveLinks,
  signedOff,
  findings,
}: {
  readonly plan: Plan;
  readonly ofVisit: Pick<PlanShape, 'visit' | 'athlete' | 'coachId' | 'side' | 'safety'>;
  readonly items: readonly PlanItem[];
  readonly given: readonly GivenPlan[];
  readonly pain: readonly PlanPain[];
  readonly ticks: Tick[];
  readonly liveLinks: number;
  readonly signedOff: PlanShape['signedOff'];
  /** What is found now, where that is something else. */
  readonly findings: readonly FindingOfSide[];
}): PlanShape => {
  const safety = stateOf(ofVisit.safety);
  const [last] = given;
  return {
    id: plan.id,
    ...ofVisit,
    basis: plan.basis,
    signedOff,
    rule: plan.rule ?? null,
    because: plan.because,
    items: items.map((item) => presentItem(item, safety)),
    note: plan.note,
    retestOn: plan.retestOn ?? null,
    state: planStateOf(
      plan.version,
      last ? { planVersion: last.planVersion, stopped: !last.content } : null,
    ),
    missing: missingOf(plan, items, safety),
    given: given.map(({ number, content, by, at }) => ({
      number,
      at: at.toISOString(),
      by: presentPerson(by.unwrap()),
      plan: content ?? null,
    })),
    ticks,
    pain: pain.map(presentPain),
    liveLinks,
    findings: findings.map(presentFinding),
    madeBy: presentPerson(plan.madeBy.unwrap()),
    madeAt: plan.madeAt.toISOString(),
    version: plan.version,
  };
};

import type {
  Finding,
  Plan,
  PlanBasis,
  PlanItem,
  PlanState,
  SignedOff,
} from '#shared/contracts/plans.ts';
import { exerciseOf } from '#shared/plan/library.ts';
import type { StateKind } from '#src/ui/state-dot.tsx';
import { moment } from '#src/ui/days.ts';
import { SAFETY_SHORT } from '#src/ui/exercise-words.ts';
import { SEEN_WORDS } from '#src/ui/words.ts';

/** What a plan starts from, and whether it was measured or seen. */
export const basisWords = (basis: PlanBasis): { title: string; from: string } =>
  basis.kind === 'reading'
    ? {
        title: basis.label,
        from:
          basis.carrier === null
            ? 'the measured reading'
            : `the measured reading, mostly by the ${basis.carrier}`,
      }
    : { title: SEEN_WORDS[basis.seen], from: 'seen by the coach, not measured' };

/** Whether a reviewer stands behind what a plan starts from. */
export const signedOffWords = (signedOff: SignedOff | null): { kind: StateKind; words: string } =>
  signedOff
    ? { kind: 'done', words: `signed off by ${signedOff.by.name}, ${moment(signedOff.at)}` }
    : { kind: 'wait', words: 'not signed off' };

export const HINDRANCE_WORDS: Record<NonNullable<Finding['hindrance']>, string> = {
  provisional:
    'The reading is provisional: look at the followed marks first. A plan starts from what is final.',
  'being-made-anew': 'The reading is being made anew. Open it, then come back.',
};

export const STATE_WORDS: Record<PlanState, { kind: StateKind; words: string }> = {
  draft: { kind: 'wait', words: 'not given yet' },
  given: { kind: 'done', words: 'given to the athlete' },
  'changed-since': { kind: 'wait', words: 'changed since it was given' },
  stopped: { kind: 'bad', words: 'stopped' },
};

/** The answers that stand against an exercise, in a sentence. */
export const heldBackWords = ({ heldBack }: PlanItem, asked: boolean): string => {
  const what = heldBack.map((question) => SAFETY_SHORT[question]).join('; ');
  return asked ? `Held back for ${what}.` : `Held back until this is asked: ${what}.`;
};

export const MAY_NOT_WORDS: Record<NonNullable<PlanItem['mayNot']>, string> = {
  'ask-first': 'Ask the safety questions first: what was not answered is not a no.',
  'needs-clearance':
    'Whoever treats this athlete has set the limit. Write down with the safety questions who cleared it; until then it stays out.',
};

export const nameOf = ({ exercise }: Pick<PlanItem, 'exercise'>): string =>
  exerciseOf(exercise).name;

/** An item as it is sent back. */
export const bodyOf = ({ exercise, stage, side, sideConfirmed, dose, cue }: PlanItem) => ({
  exercise,
  stage,
  side,
  sideConfirmed,
  dose,
  cue,
});

/** The whole list with one of them changed. */
export const withItem = (
  { items }: Pick<Plan, 'items'>,
  exercise: PlanItem['exercise'],
  change: Partial<ReturnType<typeof bodyOf>> & { despite?: string | null },
) =>
  items.map((item) => (item.exercise === exercise ? { ...bodyOf(item), ...change } : bodyOf(item)));

import type { AthletePlan, GivenPlan } from '#shared/contracts/athlete-plan.ts';
import type { Plan, PlanItem, PlanStart } from '#shared/contracts/plans.ts';
import { ALWAYS_STOP } from '#shared/plan/cautions.ts';
import { exerciseOf, type ExerciseId } from '#shared/plan/library.ts';
import { sideLines } from '#shared/plan/sides.ts';
import { athleteId, coachId, visitId } from './records.ts';

export const planId = '00000000-0000-4000-8000-000000000800';
const by = { id: coachId, name: 'Maren Okafor' };
const at = '2026-03-03T16:20:00Z';
const no = Object.fromEntries(
  exerciseOf('skip-drill').notWith.map((question) => [question, false]),
);

export const aPlanItem = (exercise: ExerciseId, change: Partial<PlanItem> = {}): PlanItem => ({
  exercise,
  stage: 1,
  side: 'right',
  sideConfirmed: true,
  dose: exerciseOf(exercise).dose,
  cue: '',
  heldBack: [],
  mayNot: null,
  undecided: false,
  decision: null,
  ...change,
});

const ofVisit = {
  visit: { id: visitId, day: '2026-03-03' },
  athlete: { id: athleteId, name: 'Ines Marlow', cautions: 'Old ankle sprain.' },
  coachId,
  side: 'right',
  safety: { visitId, day: '2026-03-03', answers: no, clearedBy: null },
} as const;

/** A plan of two exercises that could be given as it stands. */
export const aPlan = (change: Partial<Plan> = {}): Plan => ({
  id: planId,
  ...ofVisit,
  basis: { kind: 'reading', code: 'early-turn-out', label: 'Turns out early', carrier: null },
  signedOff: null,
  rule: 'early',
  because: 'The standing hip turns out early.',
  items: [aPlanItem('foot-tripod'), aPlanItem('supported-hinge', { stage: 2 })],
  note: '',
  retestOn: '2026-04-14',
  state: 'draft',
  missing: [],
  given: [],
  ticks: [],
  pain: [],
  liveLinks: 1,
  findings: [],
  madeBy: by,
  madeAt: at,
  version: 3,
  ...change,
});

export const aPlanStart = (change: Partial<PlanStart> = {}): PlanStart => ({
  ...ofVisit,
  planId: null,
  findings: [
    {
      basis: { kind: 'reading', code: 'cannot-tell', label: 'Can’t tell yet', carrier: null },
      suggestion: { kind: 'retest', because: 'The reading does not tell yet.' },
      hindrance: null,
      signedOff: null,
    },
    {
      basis: { kind: 'call', seen: 'early' },
      suggestion: {
        kind: 'plan',
        rule: 'early',
        because: 'The standing hip turns out early.',
        exercises: [{ exercise: 'foot-tripod', stage: 1 }],
      },
      hindrance: null,
      signedOff: null,
    },
  ],
  ...change,
});

/** Two exercises as an athlete got them. */
export const aGivenPlan = (change: Partial<GivenPlan> = {}): GivenPlan => ({
  items: (['foot-tripod', 'supported-hinge'] as const).map((id, n) => {
    const { side: rule, notWith: _, source: __, id: exercise, ...words } = exerciseOf(id);
    return {
      ...words,
      exercise,
      setUp: [...words.setUp],
      cues: [...words.cues],
      goOnWhen: [...words.goOnWhen],
      goBackWhen: [...words.goBackWhen],
      notWhen: [...words.notWhen],
      stage: n + 1,
      side: 'left' as const,
      cue: n === 0 ? 'Toes long.' : '',
      sideLines: sideLines(rule, 'left'),
    };
  }),
  note: 'Slowly, and barefoot.',
  retestOn: '2026-04-14',
  stop: ALWAYS_STOP,
  ...change,
});

export const anAthletePlan = (change: Partial<AthletePlan> = {}): AthletePlan => ({
  givenAt: at,
  plan: aGivenPlan(),
  ticks: [],
  newerGivenAt: null,
  ...change,
});

import type { ReportContent, ReportPlan, ReportSide } from '../report-content.ts';
import { counted } from './report-words.ts';

export type Cut = 'whole' | 'short' | 'shortest';

/** How much of each is told. */
const MOST = {
  whole: { calls: Infinity, letters: Infinity, exercises: Infinity, purposes: true },
  short: { calls: 3, letters: 160, exercises: Infinity, purposes: true },
  shortest: { calls: 2, letters: 80, exercises: 8, purposes: false },
} as const satisfies Record<Cut, object>;

type Most = (typeof MOST)[Cut];

interface Counts {
  calls: number;
  texts: number;
  exercises: number;
  purposes: number;
}

/** The first call stays, for it was made before any other; then the latest. */
const sideCut = (side: ReportSide, { calls: most }: Most, counts: Counts): ReportSide => {
  const { calls, calledBy } = side;
  const over = calls.length - most;
  if (over <= 0) return side;
  counts.calls += over;
  const kept = <T>(list: readonly T[]): T[] => [...list.slice(0, 1), ...list.slice(1 + over)];
  return { ...side, calls: kept(calls), calledBy: kept(calledBy) };
};

const planCut = (plan: ReportPlan, most: Most, counts: Counts): ReportPlan => {
  const cut = (text: string): string => {
    if (text.length <= most.letters) return text;
    counts.texts += 1;
    return `${text.slice(0, most.letters).trimEnd()} …`;
  };
  const items = plan.items.slice(0, most.exercises);
  counts.exercises += plan.items.length - items.length;
  if (!most.purposes) counts.purposes += items.length;
  return {
    ...plan,
    note: cut(plan.note),
    items: items.map((item) => ({
      ...item,
      cue: cut(item.cue),
      purpose: most.purposes ? item.purpose : '',
    })),
  };
};

/** What there is room for, and in words what is left out. */
export const cutShort = (
  content: ReportContent,
  cut: Cut,
): { readonly content: ReportContent; readonly leftOut: readonly string[] } => {
  const counts: Counts = { calls: 0, texts: 0, exercises: 0, purposes: 0 };
  const sides = content.sides.map((side) => sideCut(side, MOST[cut], counts));
  const plans = content.plans.map((plan) => planCut(plan, MOST[cut], counts));
  const { calls, texts, exercises, purposes } = counts;
  const leftOut = [
    calls > 0 ? `${counted(calls, 'call')} by eye between the first and the last` : '',
    exercises > 0 ? counted(exercises, 'exercise') : '',
    purposes > 0 ? 'what each exercise is for' : '',
    texts > 0 ? `the end of ${counted(texts, 'long note or cue', 'long notes and cues')}` : '',
  ].filter((part) => part !== '');
  return { content: { ...content, sides, plans }, leftOut };
};

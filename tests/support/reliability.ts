import type { MarkingPair, Reliability } from '#shared/contracts/reliability.ts';
import type {
  SecondMarkingDocument,
  SecondMarkingSummary,
} from '#shared/contracts/second-markings.ts';
import { READING_CODES } from '#shared/reading/types.ts';
import { answerAgreementOf, valueAgreementOf } from '#shared/reliability/summary.ts';
import { STANDARD_RULES } from '#shared/protocol/protocol.ts';
import { aClip, athleteId, coachId, otherId, visitId } from './records.ts';

/** Answers about frames marked twice, for component tests. */
const at = '2026-03-03T16:20:00Z';
export const maren = { id: coachId, name: 'Maren Okafor' };
export const jonas = { id: otherId, name: 'Jonas Reed' };
export const secondId = '00000000-0000-4000-8000-000000000700';

export const aSecondSummary = (
  change: Partial<SecondMarkingSummary> = {},
): SecondMarkingSummary => ({
  id: secondId,
  repId: '00000000-0000-4000-8000-000000000801',
  marker: maren,
  askedBy: maren,
  askedAt: at,
  openedAt: at,
  finishedAt: null,
  frames: 10,
  framesDone: 3,
  mine: true,
  ...change,
});

export const aRepeat: MarkingPair['repeat'] = {
  frames: 24,
  marks: 168,
  px: 1.7,
  mm: 2.4,
  landmarks: [
    { landmark: 'knee-inner', marks: 24, px: 2.9, mm: 4.1 },
    { landmark: 'asis-support', marks: 24, px: 1.2, mm: null },
  ],
};

export const aSecondMarking = (
  change: Partial<SecondMarkingDocument> = {},
): SecondMarkingDocument => ({
  summary: aSecondSummary({ finishedAt: at, framesDone: 10 }),
  athlete: { id: athleteId, name: 'Ines Marlow' },
  visit: { id: visitId, day: '2026-03-03' },
  clip: { ...aClip(), frames: { count: 2, timeBase: { num: 1, den: 60 }, ticks: [0, 1] } },
  repNumber: 2,
  supportSide: 'right',
  view: 'front',
  frames: [{ frame: 1, landmarks: ['asis-support'] }],
  marks: [],
  protocol: { version: 1, at, rules: STANDARD_RULES },
  agreement: {
    repeat: aRepeat,
    firstBy: [maren],
    hiddenOnce: 1,
    readings: { first: 'early-turn-out', second: 'cannot-tell' },
  },
  ...change,
});

const pairs = [-4, -1, 0, 2, 5, 9].map((turn, n) => [turn, turn + (n % 2 ? 0.6 : -0.2)] as const);
const turn = valueAgreementOf(pairs);
const few = valueAgreementOf(pairs.slice(0, 2));

export const aPair = (change: Partial<MarkingPair> = {}): MarkingPair => ({
  first: maren,
  second: maren,
  repeat: aRepeat,
  turn: { ...turn, points: [...turn.points] },
  lift: { ...few, points: [...few.points] },
  readings: answerAgreementOf(READING_CODES, []),
  ...change,
});

export const aReliability = (change: Partial<Reliability> = {}): Reliability => ({
  people: [{ person: maren, px: 3, fromFrames: 0, frames: 0 }],
  least: 20,
  repeats: [],
  between: [],
  waiting: [],
  practice: null,
  calls: [],
  ...change,
});

import type { ReviewItem, ReviewStep, SideReview } from '#shared/contracts/reviews.ts';
import { athleteId, clipId, coachId, otherId, visitId } from './records.ts';

/** Answers about reviews, for component tests. */
const maren = { id: coachId, name: 'Maren Okafor' };
const tobias = { id: otherId, name: 'Tobias Lindqvist' };

/** A measured side with an open comment of the reviewer's own. */
export const aWaitingReview = <const T extends object>(change: T): ReviewItem & T => ({
  visitId,
  side: 'right',
  day: '2026-03-03',
  athlete: { id: athleteId, name: 'Ines Marlow' },
  coach: maren,
  at: '2026-03-03T16:42:00Z',
  about: 'reading',
  label: 'Turns out early',
  change: 6.8,
  plusMinus: 3.6,
  seen: 'early',
  again: false,
  openComments: 2,
  opens: { clipId, frame: 96, commentId: otherId, mine: true },
  ...change,
});

export const aReviewStep = (
  step: ReviewStep['step'],
  change: Partial<ReviewStep> = {},
): ReviewStep => ({
  id: `00000000-0000-4000-8000-00000000090${step.length % 10}`,
  step,
  about: { kind: 'reading', id: otherId },
  label: 'Turns out early',
  seen: null,
  reason: '',
  by: step === 'handed-in' ? maren : tobias,
  at: '2026-03-03T16:42:00Z',
  ...change,
});

export const aSideReview = (change: Partial<SideReview> = {}): SideReview => ({
  state: 'none',
  steps: [],
  reviewers: [tobias],
  openComments: 0,
  may: { handIn: true, decide: false },
  ...change,
});

import { readingLabel } from '#shared/contracts/readings.ts';
import type { ReviewState, ReviewStep } from '#shared/contracts/reviews.ts';
import { presentPerson } from '../accounts/accounts.presenter.ts';
import type { Review } from './review.entity.ts';

/** @param review with `by`, `reading` and `call` loaded */
export const presentStep = (review: Review): ReviewStep => {
  const reading = review.reading?.unwrap();
  const call = review.call?.unwrap();
  const about = reading ?? call;
  if (!about) throw new Error('A review is about a reading or a call.');
  return {
    id: review.id,
    step: review.step,
    about: { kind: reading ? 'reading' : 'call', id: about.id },
    label: reading ? readingLabel(reading.code, reading.before60, reading.gateFrom) : null,
    seen: call?.seen ?? null,
    reason: review.reason,
    by: presentPerson(review.by.unwrap()),
    at: review.at.toISOString(),
  };
};

/** Where a side stands, from its latest step and the ids of what stands there now. */
export const reviewStateOf = (
  last: { step: ReviewStep['step']; reading: string | null; call: string | null } | null,
  now: { reading: string | null; call: string | null },
): ReviewState => {
  if (!last) return 'none';
  if (last.step === 'handed-in') return 'waits';
  if (last.step === 'sent-back') return 'sent-back';
  const same = last.reading === null ? last.call === now.call : last.reading === now.reading;
  return same ? 'signed-off' : 'changed';
};

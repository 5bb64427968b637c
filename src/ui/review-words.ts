import type { ReviewItem, ReviewState } from '#shared/contracts/reviews.ts';
import { plusMinus, turn } from './figures.ts';
import { paths } from './paths.ts';
import type { StateKind } from './state-dot.tsx';
import { SEEN_WORDS, supportWords } from './words.ts';

/** Where a side's review stands, with its dot; null where there is nothing to say. */
export const REVIEW_STATES = {
  none: null,
  waits: { kind: 'wait', words: 'waits for review' },
  'sent-back': { kind: 'bad', words: 'sent back' },
  'signed-off': { kind: 'done', words: 'signed off' },
  changed: { kind: 'wait', words: 'changed since sign-off' },
} as const satisfies Record<ReviewState, { kind: StateKind; words: string } | null>;

/** `Ines Marlow, right support: “Turns out early”` */
export const reviewTitle = (item: ReviewItem): string => {
  const who = `${item.athlete.name}, ${supportWords(item.side)}`;
  if (item.about === 'reading' && item.label !== null) return `${who}: “${item.label}”`;
  return item.seen === null ? who : `${who}: ${SEEN_WORDS[item.seen].toLowerCase()}, by eye`;
};

const figures = ({ change, plusMinus: half, seen, about }: ReviewItem): string => {
  const eye = seen === null ? '' : `by eye: ${SEEN_WORDS[seen].toLowerCase()}`;
  if (about === 'call') return 'Seen, not measured.';
  if (change === null || half === null) return eye === '' ? '' : `No figure, ${eye}.`;
  return `${turn(change)} ${plusMinus(half)}${eye === '' ? '' : `, ${eye}`}.`;
};

const opening = ({ opens, openComments }: ReviewItem): string => {
  if (opens === null) return 'No clip of this side.';
  if (opens.commentId === null) return 'No open comment.';
  const others = openComments - 1;
  const more = others === 0 ? '' : ` and ${others} more ${others === 1 ? 'is' : 'are'} open`;
  return `Opens at frame ${opens.frame}, ${opens.mine ? 'your open comment' : 'an open comment'}${more}.`;
};

/** Where its clip opens; null without one. */
export const reviewClipPath = ({ opens }: ReviewItem): string | null =>
  opens &&
  paths.bench(opens.clipId, {
    frame: opens.frame,
    ...(opens.commentId === null ? {} : { comment: opens.commentId }),
  });

/** What is known before it is opened, in two or three short sentences. */
export const reviewDetail = (item: ReviewItem): string =>
  [
    item.again ? `Handed in again by ${item.coach.name} after it was sent back.` : '',
    figures(item),
    opening(item),
  ]
    .filter((part) => part !== '')
    .join(' ');

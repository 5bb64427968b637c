import type { SideReview, ReviewSubject } from '#shared/contracts/reviews.ts';
import { moment } from '#src/ui/days.ts';
import { listed } from '#src/ui/listed.ts';

/** What stands at the head of the panel. */
export const standing = (review: SideReview, { kind }: ReviewSubject): string => {
  const [last] = review.steps;
  const names = review.reviewers.map(({ name }) => name);
  switch (review.state) {
    case 'none':
      return kind === 'reading' ? 'This reading is not handed in' : 'This call is not handed in';
    case 'waits':
      return names.length === 0 ? 'Waiting for a reviewer' : `Waiting for ${listed(names, 'or')}`;
    case 'sent-back':
      return `Sent back by ${last?.by.name ?? 'a reviewer'}`;
    case 'signed-off':
      return `Signed off by ${last?.by.name ?? 'a reviewer'}, ${last ? moment(last.at) : ''}`;
    case 'changed':
      return 'Changed since it was signed off';
  }
};

/** What that means, and what comes next. */
export const meaning = (review: SideReview, { kind }: ReviewSubject): string => {
  const what = kind === 'reading' ? 'reading' : 'call by eye';
  switch (review.state) {
    case 'none':
      return review.reviewers.length === 0
        ? 'Nobody here can sign it off yet: it takes a supervisor of this coach, with the athlete’s consent, or an owner who is not the coach.'
        : `Hand it in when it is ready: ${listed(
            review.reviewers.map(({ name }) => name),
            'or',
          )} then finds it at the top of the queue, the longest waiting first.`;
    case 'waits':
      return `Handed in by ${review.steps[0]?.by.name ?? 'the coach'}.`;
    case 'sent-back':
      return 'Mend what is named, or answer it in a comment on the Bench; then hand it in again.';
    case 'signed-off':
      return `This ${what} stays as it was signed off. Other marks make another reading beside it.`;
    case 'changed':
      return `What was signed off stays as it was; what stands here now is another ${what} and waits for nobody yet.`;
  }
};

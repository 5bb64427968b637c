import { useQuery } from '@tanstack/react-query';
import type { SidePage } from '#shared/contracts/readings.ts';
import type { ReviewSubject } from '#shared/contracts/reviews.ts';
import { sideReviewOptions } from '#src/api/reviews.queries.ts';
import { Section } from '#src/ui/page.tsx';
import { ErrorState, Loading } from '#src/ui/states.tsx';
import { ReviewSteps } from './review-steps.tsx';
import { SignOffPanel } from './sign-off-panel.tsx';

/** What a word would be about: the reading where there is one, otherwise the latest call by eye. */
const subjectOf = ({ reading, calls }: SidePage): ReviewSubject | null => {
  if (reading) return { kind: 'reading', id: reading.id };
  const last = calls.at(-1);
  return last ? { kind: 'call', id: last.id } : null;
};

/** The reviewer's word on this side: who waits for whom, the two acts, and every step so far. */
export function SignOffSection({ page }: { page: SidePage }) {
  const { visit, side } = page;
  const review = useQuery(sideReviewOptions(visit.id, side));
  const subject = subjectOf(page);
  const { data } = review;
  return (
    <Section
      id="sign-off"
      title="Sign-off"
      note="A second pair of eyes."
      margin={data && data.steps.length > 0 && <ReviewSteps steps={data.steps} />}
    >
      {review.isPending && <Loading label="Loading the review" />}
      {review.isError && !data && (
        <ErrorState error={review.error} onRetry={() => void review.refetch()} />
      )}
      {data && subject && <SignOffPanel page={page} review={data} subject={subject} />}
    </Section>
  );
}

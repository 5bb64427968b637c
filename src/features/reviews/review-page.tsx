import { useQuery } from '@tanstack/react-query';
import type { ReviewItem } from '#shared/contracts/reviews.ts';
import { useMe } from '#src/api/me.ts';
import { reviewQueueQuery } from '#src/api/reviews.queries.ts';
import { ButtonLink } from '#src/ui/button-link.tsx';
import { moment } from '#src/ui/days.ts';
import { capital, inWords } from '#src/ui/figures.ts';
import { Page, Section } from '#src/ui/page.tsx';
import { paths } from '#src/ui/paths.ts';
import { Empty, ErrorState, Loading, SkeletonLines } from '#src/ui/states.tsx';
import { ReviewRow } from './review-row.tsx';
import { MarkedAgain } from './marked-again.tsx';
import { EyesSection } from './eyes-section.tsx';

const leadOf = (items: readonly ReviewItem[], total: number): string => {
  const [oldest] = items;
  if (!oldest) return 'Nothing waits for your word.';
  const what = total === 1 ? 'One side waits' : `${capital(inWords(total))} sides wait`;
  return `${what} for your word, the oldest since ${moment(oldest.at)}.`;
};

/** `/review`: what waits for a reviewer's word, and how well hands and eyes agree. */
export function ReviewPage() {
  const queue = useQuery(reviewQueueQuery);
  return (
    <Page title="Review" lead={queue.data && leadOf(queue.data.items, queue.data.total)}>
      {queue.isPending && (
        <Section title="To review" wide first>
          <Loading label="Looking for what waits">
            <SkeletonLines count={4} />
          </Loading>
        </Section>
      )}
      {queue.isError && !queue.data && (
        <ErrorState error={queue.error} onRetry={() => void queue.refetch()} />
      )}
      {queue.data && <Queue items={queue.data.items} total={queue.data.total} />}
      <MarkedAgain />
      <EyesSection />
    </Page>
  );
}

function Queue({ items, total }: { items: readonly ReviewItem[]; total: number }) {
  const { user } = useMe();
  return (
    <Section
      title="To review"
      wide
      first
      note={
        items.length > 0 && (
          <span className="mt-1 block text-value font-light leading-10 tracking-[-0.015em] text-ink">
            {total}
          </span>
        )
      }
    >
      {items.length === 0 ? (
        <Empty
          title="No side waits for your word"
          action={<ButtonLink to={paths.athletes()}>Open the athletes</ButtonLink>}
        >
          {user.role === 'coach'
            ? 'A supervisor or the owner signs your readings off. Hand a side in on its reading page; what comes back stands in Today.'
            : 'A side stands here once its coach has handed it in, the longest waiting first. Nobody signs off their own athletes’ readings.'}
        </Empty>
      ) : (
        <>
          <ul>
            {items.map((item, n) => (
              <ReviewRow key={`${item.visitId} ${item.side}`} item={item} pressing={n === 0} />
            ))}
          </ul>
          {total > items.length && (
            <p className="mt-4 text-soft">
              The {items.length} that have waited longest; {total - items.length} more follow.
            </p>
          )}
        </>
      )}
    </Section>
  );
}

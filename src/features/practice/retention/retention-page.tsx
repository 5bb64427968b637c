import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import type { RetentionPage as Retention } from '#shared/contracts/retention.ts';
import { retentionQuery } from '#src/api/retention.queries.ts';
import { useMayInPractice } from '#src/api/use-may.ts';
import { Page } from '#src/ui/page.tsx';
import { paths } from '#src/ui/paths.ts';
import { Empty, ErrorState, Loading, SkeletonLines } from '#src/ui/states.tsx';
import { ErasuresSection } from './erasures-section.tsx';
import { GoingSection } from './going-section.tsx';
import { OnePerson } from './one-person.tsx';
import { TermForm } from './term-form.tsx';

/** How long this practice keeps what it holds, who goes when, and everything of one person. */
export function RetentionPage() {
  const may = useMayInPractice();
  return (
    <Page
      title="Retention"
      crumbs={[{ label: 'Practice', to: paths.practice() }, { label: 'retention' }]}
      lead="How long the practice keeps what it holds of its athletes, what goes next, and the way to hand out or erase everything of one person."
    >
      {may('retention.read') ? (
        <Asked />
      ) : (
        <Empty title="The owner of the practice sets this">
          Ask them where an athlete wants their data, or wants it erased.
        </Empty>
      )}
    </Page>
  );
}

function Asked() {
  const retention = useQuery(retentionQuery);
  if (retention.data) return <Opened retention={retention.data} />;
  if (retention.isError)
    return <ErrorState error={retention.error} onRetry={() => void retention.refetch()} />;
  return (
    <Loading label="Loading the retention">
      <SkeletonLines count={6} />
    </Loading>
  );
}

function Opened({ retention: { term, erasures } }: { retention: Retention }) {
  // what is typed is shown in the preview before it is saved
  const [typed, setTyped] = useState(term.keepMonths);
  return (
    <>
      <TermForm term={term} onTyped={setTyped} />
      <GoingSection keepMonths={typed} saved={typed === term.keepMonths} />
      <OnePerson />
      <ErasuresSection erasures={erasures} />
    </>
  );
}

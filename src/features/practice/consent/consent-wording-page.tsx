import { useQuery } from '@tanstack/react-query';
import type { ConsentWordingPage as Wordings } from '#shared/contracts/consents.ts';
import { consentWordingQuery } from '#src/api/consents.queries.ts';
import { useMe } from '#src/api/me.ts';
import { useMayInPractice } from '#src/api/use-may.ts';
import { dayOf } from '#src/ui/days.ts';
import { Page, Section } from '#src/ui/page.tsx';
import { paths } from '#src/ui/paths.ts';
import { ErrorState, Loading, SkeletonLines } from '#src/ui/states.tsx';
import { WordingForm } from './wording-form.tsx';
import { WordingHistory } from './wording-history.tsx';
import { WordingRead } from './wording-read.tsx';

/** What this practice reads out when it asks for consent, in versions that every consent names. */
export function ConsentWordingPage() {
  const wordings = useQuery(consentWordingQuery);
  const { practice } = useMe();
  return (
    <Page
      title="Consent wording"
      crumbs={[{ label: 'Practice', to: paths.practice() }, { label: 'consent wording' }]}
      lead={
        wordings.data
          ? `Wording ${wordings.data.current.version} of ${practice.name}, ${dayOf(wordings.data.current.at)}. Each consent names the version it was given to.`
          : 'What is read out when a consent is asked for, in versions. Each consent names the version it was given to.'
      }
    >
      {wordings.data ? (
        <Opened wordings={wordings.data} />
      ) : wordings.isError ? (
        <ErrorState error={wordings.error} onRetry={() => void wordings.refetch()} />
      ) : (
        <Loading label="Loading the wording">
          <SkeletonLines count={8} />
        </Loading>
      )}
    </Page>
  );
}

function Opened({ wordings: { current, history } }: { wordings: Wordings }) {
  const may = useMayInPractice();
  return (
    <>
      {may('consent-wording.change') ? (
        <WordingForm key={current.id} current={current} />
      ) : (
        <Section title="Wording" first margin={<p>The owner of the practice writes it.</p>}>
          <WordingRead texts={current.texts} />
        </Section>
      )}
      <WordingHistory history={history} />
    </>
  );
}

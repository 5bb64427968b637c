import { useQuery } from '@tanstack/react-query';
import { useParams, useSearchParams } from 'react-router-dom';
import { athleteOptions } from '#src/api/athletes.queries.ts';
import { consentWordingQuery } from '#src/api/consents.queries.ts';
import { Page } from '#src/ui/page.tsx';
import { paths } from '#src/ui/paths.ts';
import { ErrorState, Loading } from '#src/ui/states.tsx';
import { fullName } from './athlete-words.ts';
import { ConsentForm } from './consent-form.tsx';

/** Records who agreed to what. `?then=visit` goes on to a new visit. */
export function NewConsentPage() {
  const { id = '' } = useParams();
  const [search] = useSearchParams();
  const athlete = useQuery(athleteOptions(id));
  const wording = useQuery(consentWordingQuery);
  const next = search.get('then') === 'visit' ? paths.newVisit(id) : paths.athlete(id);
  return (
    <Page
      title="Record a consent"
      crumbs={[
        { label: 'Athletes', to: paths.athletes() },
        { label: athlete.data ? fullName(athlete.data) : 'athlete', to: paths.athlete(id) },
        { label: 'consent' },
      ]}
      lead="Say what happens with the pictures, then ask for each purpose by itself. A no to one does not touch the others."
    >
      {(athlete.isPending || wording.isPending) && <Loading />}
      {athlete.isError && (
        <ErrorState error={athlete.error} onRetry={() => void athlete.refetch()} />
      )}
      {athlete.data && wording.isError && (
        <ErrorState error={wording.error} onRetry={() => void wording.refetch()} />
      )}
      {athlete.data && wording.data && (
        <ConsentForm
          key={wording.data.current.id}
          athlete={athlete.data}
          wording={wording.data.current}
          next={next}
        />
      )}
    </Page>
  );
}

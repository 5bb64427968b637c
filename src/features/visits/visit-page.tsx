import { useQuery } from '@tanstack/react-query';
import { useParams } from 'react-router-dom';
import type { Clip } from '#shared/contracts/clips.ts';
import type { Visit } from '#shared/contracts/visits.ts';
import { athleteOptions } from '#src/api/athletes.queries.ts';
import { useMay } from '#src/api/use-may.ts';
import { visitOptions } from '#src/api/visits.queries.ts';
import { ButtonLink } from '#src/ui/button-link.tsx';
import { longDay, shortDay } from '#src/ui/days.ts';
import { Page } from '#src/ui/page.tsx';
import { paths } from '#src/ui/paths.ts';
import { ErrorState, Loading, Skeleton, SkeletonLines } from '#src/ui/states.tsx';
import { CallStep } from './call-step.tsx';
import { UploadStep } from './clips/upload-step.tsx';
import { ConsentStep } from './consent-step.tsx';
import { FilmStep } from './filming/film-step.tsx';
import { ReportsSection } from './reports-section.tsx';
import { SafetyStep } from './safety/safety-step.tsx';
import { TakeAway } from './take-away.tsx';
import { useHashTarget } from '#src/ui/use-hash-target.ts';
import { VisitSteps } from './visit-steps.tsx';

/** One day's testing of one athlete, from the consent to the call by eye. */
export function VisitPage() {
  const { id = '' } = useParams();
  const page = useQuery(visitOptions(id));
  if (page.data) return <Opened visit={page.data.visit} clips={page.data.clips} />;
  return (
    <Page
      title={page.isError ? 'Visit' : <Skeleton className="h-11 w-72 max-w-full" />}
      documentTitle="Visit"
    >
      {page.isError ? (
        <ErrorState error={page.error} onRetry={() => void page.refetch()} />
      ) : (
        <Loading label="Loading the visit">
          <SkeletonLines count={8} />
        </Loading>
      )}
    </Page>
  );
}

function Opened({ visit, clips }: { visit: Visit; clips: readonly Clip[] }) {
  useHashTarget();
  const athlete = useQuery(athleteOptions(visit.athlete.id));
  const consented = athlete.data?.consentedTo.includes('assessment');
  const may = useMay(athlete.data?.coach.id);
  // clips that are here stay to be worked on; nothing new is filmed without both
  const open = consented === true && visit.safety?.mayFilm === true;
  return (
    <Page
      title={`Visit of ${shortDay(visit.day)}`}
      documentTitle={`${visit.athlete.name}, ${longDay(visit.day)}`}
      crumbs={[
        { label: 'Athletes', to: paths.athletes() },
        { label: visit.athlete.name, to: paths.athlete(visit.athlete.id) },
        { label: 'visit' },
      ]}
      lead={
        <>
          <VisitSteps consented={consented === true} visit={visit} clips={clips} />
          {visit.note !== '' && <p className="mt-3 text-body text-soft">{visit.note}</p>}
        </>
      }
      actions={
        clips.length > 0 && (
          <ButtonLink to={paths.compare({ athlete: visit.athlete.id })}>Compare</ButtonLink>
        )
      }
    >
      <ConsentStep athlete={athlete} visit={visit} may={may} />
      <SafetyStep visit={visit} may={may} />
      <FilmStep visit={visit} may={may} beforeClips={clips.length === 0} />
      <UploadStep visit={visit} clips={clips} may={may} open={open} />
      <CallStep visit={visit} clips={clips} may={may} />
      <ReportsSection visitId={visit.id} clips={clips} may={may} />
      <TakeAway visitId={visit.id} clips={clips} />
    </Page>
  );
}

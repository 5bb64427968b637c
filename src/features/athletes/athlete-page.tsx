import { useQuery } from '@tanstack/react-query';
import { useParams } from 'react-router-dom';
import type { Athlete } from '#shared/contracts/athletes.ts';
import { athleteOptions, athleteVisitsOptions } from '#src/api/athletes.queries.ts';
import { useMay } from '#src/api/use-may.ts';
import { ButtonLink } from '#src/ui/button-link.tsx';
import { capital, inWords } from '#src/ui/figures.ts';
import { Page, Section } from '#src/ui/page.tsx';
import { paths } from '#src/ui/paths.ts';
import { Caution, Empty, ErrorState, Loading, Skeleton, SkeletonLines } from '#src/ui/states.tsx';
import { aboutAthlete, fullName } from './athlete-words.ts';
import { ConsentSection } from './consent-section.tsx';
import { LinksSection } from './links-section.tsx';
import { PlansSection } from './plans-section.tsx';
import { TrendSection } from './trend-section.tsx';
import { VisitTable } from './visit-table.tsx';

/** One athlete: what to be careful with, trend, visits and consent. */
export function AthletePage() {
  const { id = '' } = useParams();
  const athlete = useQuery(athleteOptions(id));
  const crumbs = [{ label: 'Athletes', to: paths.athletes() }];
  if (athlete.data) return <Known athlete={athlete.data} crumbs={crumbs} />;
  return (
    <Page
      title={athlete.isError ? 'Athlete' : <Skeleton className="h-11 w-72 max-w-full" />}
      documentTitle="Athlete"
      crumbs={crumbs}
    >
      {athlete.isError ? (
        <ErrorState error={athlete.error} onRetry={() => void athlete.refetch()} />
      ) : (
        <Loading label="Loading the athlete" />
      )}
    </Page>
  );
}

function Known({ athlete, crumbs }: { athlete: Athlete; crumbs: { label: string; to: string }[] }) {
  const mayFilm = athlete.consentedTo.includes('assessment');
  const may = useMay(athlete.coach.id);
  const { visitCount } = athlete;
  const visits =
    visitCount === 0
      ? 'No visit yet.'
      : `${capital(inWords(visitCount))} visit${visitCount === 1 ? '' : 's'}.`;
  return (
    <Page
      title={fullName(athlete)}
      crumbs={crumbs}
      lead={
        <p className="text-body text-soft">
          {aboutAthlete(athlete)} Coach {athlete.coach.name}. {visits}
        </p>
      }
      actions={
        <>
          {visitCount > 0 && (
            <ButtonLink to={paths.compare({ athlete: athlete.id })}>Compare</ButtonLink>
          )}
          {may('athlete.edit') && (
            <>
              <ButtonLink to={paths.editAthlete(athlete.id)}>Change details</ButtonLink>
              {mayFilm ? (
                <ButtonLink look="primary" to={paths.newVisit(athlete.id)}>
                  New visit
                </ButtonLink>
              ) : (
                <ButtonLink look="primary" to={paths.newConsent(athlete.id)}>
                  Record the consent
                </ButtonLink>
              )}
            </>
          )}
        </>
      }
    >
      {athlete.cautions !== '' && (
        <div className="mb-7 max-w-lead">
          <Caution title="Be careful with:">
            <span className="whitespace-pre-line">{athlete.cautions}</span>
          </Caution>
        </div>
      )}
      <Visits athlete={athlete} />
      <PlansSection athlete={athlete} />
      <ConsentSection athlete={athlete} />
      <LinksSection athlete={athlete} />
    </Page>
  );
}

function Visits({ athlete }: { athlete: Athlete }) {
  const may = useMay(athlete.coach.id);
  const visits = useQuery(athleteVisitsOptions(athlete.id));
  if (visits.isError && !visits.data)
    return (
      <Section title="Visits">
        <ErrorState error={visits.error} onRetry={() => void visits.refetch()} />
      </Section>
    );
  if (!visits.data)
    return (
      <Section title="Visits">
        <Loading label="Loading visits">
          <SkeletonLines count={Math.max(1, Math.min(athlete.visitCount, 6))} />
        </Loading>
      </Section>
    );
  const { items } = visits.data;
  if (items.length === 0)
    return (
      <Section title="Visits">
        <Empty title="No visit yet">
          {!may('visit.add')
            ? `${athlete.coach.name} opens the visits of this athlete.`
            : athlete.consentedTo.includes('assessment')
              ? 'A visit is one day’s testing. It asks the safety questions, guides the filming and takes the clips.'
              : 'Record the consent first; then a visit can be opened.'}
        </Empty>
      </Section>
    );
  return (
    <>
      <TrendSection
        visits={items}
        retest={
          may('visit.add') && athlete.consentedTo.includes('assessment')
            ? (visitId) => paths.newVisit(athlete.id, visitId)
            : null
        }
      />
      <Section title="Visits" wide>
        <VisitTable visits={items} />
      </Section>
    </>
  );
}

import type { UseQueryResult } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import type { Athlete } from '#shared/contracts/athletes.ts';
import type { Visit } from '#shared/contracts/visits.ts';
import type { May } from '#src/api/use-may.ts';
import { longDay } from '#src/ui/days.ts';
import { ButtonLink } from '#src/ui/button-link.tsx';
import { Section } from '#src/ui/page.tsx';
import { paths } from '#src/ui/paths.ts';
import { StateDot } from '#src/ui/state-dot.tsx';
import { Caution, ErrorState, Loading, Skeleton } from '#src/ui/states.tsx';
import { PURPOSES, PURPOSE_WORDS } from '#src/ui/words.ts';

/** What was agreed to. Without filming and marking, the steps below stay closed. */
export function ConsentStep({
  athlete,
  visit,
  may,
}: {
  athlete: UseQueryResult<Athlete>;
  visit: Visit;
  may: May;
}) {
  return (
    <Section
      id="consent"
      title="1 Consent"
      margin={
        <p>
          Each purpose stands by itself.{' '}
          <Link to={paths.athlete(visit.athlete.id)}>Who gave it, and how to withdraw it</Link>
        </p>
      }
    >
      {athlete.isPending && (
        <Loading label="Loading the consent">
          <Skeleton className="h-6 w-80 max-w-full" />
        </Loading>
      )}
      {athlete.isError && !athlete.data && (
        <ErrorState error={athlete.error} onRetry={() => void athlete.refetch()} />
      )}
      {athlete.data && <Purposes athlete={athlete.data} mayRecord={may('consent.record')} />}
      {athlete.data && athlete.data.cautions !== '' && (
        <div className="mt-5">
          <Caution title="Be careful with:">
            <span className="whitespace-pre-line">{athlete.data.cautions}</span>
          </Caution>
        </div>
      )}
    </Section>
  );
}

function Purposes({ athlete, mayRecord }: { athlete: Athlete; mayRecord: boolean }) {
  const { consentedTo, consentUntil, assentMissing } = athlete;
  if (!consentedTo.includes('assessment'))
    return (
      <>
        <StateDot kind="bad" wrap>
          {assentMissing
            ? `The child’s assent is missing: ask ${athlete.givenName} and record it. Until then filming stays closed.`
            : 'There is no consent to filming that is valid today: filming stays closed.'}
        </StateDot>
        {mayRecord && (
          <ButtonLink to={paths.newConsent(athlete.id)} look="primary" className="mt-3">
            Record the consent
          </ButtonLink>
        )}
      </>
    );
  return (
    <ul className="space-y-1.5">
      {PURPOSES.map((purpose) => (
        <li key={purpose}>
          {consentedTo.includes(purpose) ? (
            <StateDot kind="done" wrap>
              {PURPOSE_WORDS[purpose]}
              {purpose === 'assessment' &&
                consentUntil !== null &&
                `, until ${longDay(consentUntil)}`}
            </StateDot>
          ) : (
            <StateDot kind="none" wrap>
              {PURPOSE_WORDS[purpose]}: no
            </StateDot>
          )}
        </li>
      ))}
    </ul>
  );
}

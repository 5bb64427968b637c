import { useQuery } from '@tanstack/react-query';
import type { Athlete, Consent } from '#shared/contracts/athletes.ts';
import { consentsOptions } from '#src/api/athletes.queries.ts';
import { useMay } from '#src/api/use-may.ts';
import { ButtonLink } from '#src/ui/button-link.tsx';
import { longDay, moment } from '#src/ui/days.ts';
import { Fold } from '#src/ui/fold.tsx';
import { Section } from '#src/ui/page.tsx';
import { paths } from '#src/ui/paths.ts';
import { Caution, Empty, ErrorState, Loading } from '#src/ui/states.tsx';
import { PURPOSE_WORDS } from '#src/ui/words.ts';
import { GivenConsent } from './given-consent.tsx';
import { HeldPurposes } from './held-purposes.tsx';

/** What was agreed to, by whom and until when; each purpose stands by itself. */
export function ConsentSection({ athlete }: { athlete: Athlete }) {
  const may = useMay(athlete.coach.id);
  const consents = useQuery(consentsOptions(athlete.id));
  const of = (...states: Consent['state'][]) =>
    consents.data?.items.filter(({ state }) => states.includes(state)) ?? [];
  const valid = of('valid');
  const unasked = of('assent-missing');
  const past = of('lapsed', 'withdrawn');
  return (
    <Section
      id="consent"
      title="Consent"
      margin={
        <>
          <p>Without consent to filming and marking, filming stays closed.</p>
          <p>Withdrawing takes a moment and needs no reason.</p>
        </>
      }
    >
      {athlete.deletionDue !== null && (
        <div className="mb-5">
          <Caution title="Withdrawn.">
            What was filmed of {athlete.givenName} is closed, and everything about{' '}
            {athlete.givenName} is deleted on {longDay(athlete.deletionDue)}. Only a new consent
            takes that back.
          </Caution>
        </div>
      )}
      {consents.isPending && <Loading label="Loading consents" />}
      {consents.isError && !consents.data && (
        <ErrorState error={consents.error} onRetry={() => void consents.refetch()} />
      )}
      {consents.data && valid.length === 0 && (
        <Empty
          title={
            unasked.length > 0 ? 'The child’s assent is missing' : 'No consent that is valid today'
          }
          action={
            may('consent.record') ? (
              <ButtonLink to={paths.newConsent(athlete.id)}>Record the consent</ButtonLink>
            ) : undefined
          }
        >
          {unasked.length > 0
            ? `Ask ${athlete.givenName} and record it: a guardian’s consent of ${longDay(unasked[0]?.validFrom ?? '')} is here, and counts only with ${athlete.givenName}’s own yes.`
            : athlete.minor
              ? `${athlete.givenName} is a minor: a guardian gives it, and ${athlete.givenName} is asked too.`
              : 'Ask for each purpose by itself.'}
        </Empty>
      )}
      {valid.length > 0 && (
        <>
          <HeldPurposes athlete={athlete} consents={valid} />
          <ul className="mt-5">
            {valid.map((consent) => (
              <GivenConsent key={consent.id} athlete={athlete} consent={consent} />
            ))}
          </ul>
          {may('consent.record') && (
            <ButtonLink to={paths.newConsent(athlete.id)} className="mt-4">
              Record another consent
            </ButtonLink>
          )}
        </>
      )}
      {unasked.length > 0 && (
        <ul className="mt-4">
          {unasked.map((consent) => (
            <GivenConsent key={consent.id} athlete={athlete} consent={consent} />
          ))}
        </ul>
      )}
      {past.length > 0 && (
        <div className="mt-2 text-note text-soft">
          <Fold title={`Earlier consents (${past.length})`}>
            <ul>
              {past.map((consent) => (
                <PastConsent key={consent.id} consent={consent} />
              ))}
            </ul>
          </Fold>
        </div>
      )}
    </Section>
  );
}

const purposesOf = ({ purposes }: Consent): string =>
  purposes.map((purpose) => PURPOSE_WORDS[purpose].toLowerCase()).join('; ');

function PastConsent({ consent }: { consent: Consent }) {
  return (
    <li className="border-b border-rule py-2 last:border-0">
      From {longDay(consent.validFrom)} to {longDay(consent.validUntil)}
      {consent.state === 'withdrawn' && consent.withdrawnAt !== null
        ? `, withdrawn ${moment(consent.withdrawnAt)}`
        : ', lapsed'}
      : {purposesOf(consent)}.
    </li>
  );
}

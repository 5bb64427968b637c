import { useQuery, useQueryClient } from '@tanstack/react-query';
import type { Athlete, Consent } from '#shared/contracts/athletes.ts';
import { routes } from '#shared/contracts/routes.ts';
import { athletesKey, consentsOptions } from '#src/api/athletes.queries.ts';
import { call } from '#src/api/client.ts';
import { useMay } from '#src/api/use-may.ts';
import { ButtonLink } from '#src/ui/button-link.tsx';
import { ConfirmButton } from '#src/ui/confirm.tsx';
import { longDay, moment } from '#src/ui/days.ts';
import { Fold } from '#src/ui/fold.tsx';
import { Section } from '#src/ui/page.tsx';
import { paths } from '#src/ui/paths.ts';
import { StateDot } from '#src/ui/state-dot.tsx';
import { Empty, ErrorState, Loading } from '#src/ui/states.tsx';
import { useStatus } from '#src/ui/status.tsx';
import { PURPOSES, PURPOSE_WORDS } from '#src/ui/words.ts';

/** What was agreed to, by whom and until when; each purpose stands by itself. */
export function ConsentSection({ athlete }: { athlete: Athlete }) {
  const may = useMay(athlete.coach.id);
  const consents = useQuery(consentsOptions(athlete.id));
  const valid = consents.data?.items.filter(({ state }) => state === 'valid') ?? [];
  const unasked = consents.data?.items.filter(({ state }) => state === 'assent-missing') ?? [];
  const past =
    consents.data?.items.filter(({ state }) => state === 'lapsed' || state === 'withdrawn') ?? [];
  return (
    <Section
      title="Consent"
      margin={
        <>
          <p>Without consent to filming and marking, filming stays closed.</p>
          <p>Withdrawing takes a moment and needs no reason.</p>
        </>
      }
    >
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
          <ul>
            {PURPOSES.map((purpose) => {
              const until = valid
                .filter(({ purposes }) => purposes.includes(purpose))
                .map(({ validUntil }) => validUntil)
                .sort()
                .at(-1);
              return (
                <li
                  key={purpose}
                  className="flex flex-wrap justify-between gap-x-6 border-b border-rule py-2.5 first:pt-0"
                >
                  {PURPOSE_WORDS[purpose]}
                  {until === undefined ? (
                    <span className="text-soft">no</span>
                  ) : (
                    <StateDot kind="done">yes, until {longDay(until)}</StateDot>
                  )}
                </li>
              );
            })}
          </ul>
          <ul className="mt-4">
            {valid.map((consent) => (
              <GivenConsent key={consent.id} athlete={athlete} consent={consent} />
            ))}
          </ul>
          {may('consent.record') && (
            <ButtonLink to={paths.newConsent(athlete.id)} className="mt-2">
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
      {past.length > 0 && <PastConsents consents={past} />}
    </Section>
  );
}

const giver = (consent: Consent, athlete: Athlete): string => {
  if (consent.givenBy === 'athlete') return `${athlete.givenName} ${athlete.familyName}`;
  const relation = consent.guardianRelation ? ` (${consent.guardianRelation})` : '';
  return `${consent.guardianName ?? 'a guardian'}${relation}`;
};

function GivenConsent({ athlete, consent }: { athlete: Athlete; consent: Consent }) {
  const client = useQueryClient();
  const say = useStatus();
  const may = useMay(athlete.coach.id);
  const withdraw = async () => {
    await call(routes.withdrawConsent, { params: { id: consent.id } });
    await client.invalidateQueries({ queryKey: athletesKey });
    say('The consent is withdrawn.');
  };
  return (
    <li className="flex flex-wrap items-center justify-between gap-x-6 text-note text-soft">
      <p>
        Given by {giver(consent, athlete)} on {longDay(consent.validFrom)}
        {consent.assent && `; ${athlete.givenName} agreed too`}.{' '}
        {consent.how !== '' && `${consent.how.replace(/\.$/, '')}. `}
        Recorded by {consent.recordedBy.name}.
        {consent.state === 'assent-missing' &&
          ` It does not count: ${athlete.givenName}’s own yes was not recorded.`}
      </p>
      {may('consent.withdraw') && (
        <ConfirmButton
          look="plain"
          className="!text-alarm text-note"
          label="Withdraw"
          title="Withdraw this consent?"
          confirm="Withdraw it"
          onConfirm={withdraw}
        >
          <p>
            From this moment no clip of {athlete.givenName} can be filmed, sent or shown by link
            under it. Clips that are here stay until they are deleted.
          </p>
        </ConfirmButton>
      )}
    </li>
  );
}

function PastConsents({ consents }: { consents: readonly Consent[] }) {
  return (
    <div className="mt-2 text-note text-soft">
      <Fold title={`Earlier consents (${consents.length})`}>
        <ul>
          {consents.map((consent) => (
            <li key={consent.id} className="border-b border-rule py-2 last:border-0">
              From {longDay(consent.validFrom)} to {longDay(consent.validUntil)}
              {consent.state === 'withdrawn' && consent.withdrawnAt !== null
                ? `, withdrawn ${moment(consent.withdrawnAt)}`
                : ', lapsed'}
              : {consent.purposes.map((purpose) => PURPOSE_WORDS[purpose].toLowerCase()).join('; ')}
              .
            </li>
          ))}
        </ul>
      </Fold>
    </div>
  );
}

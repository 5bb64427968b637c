import { useQueryClient } from '@tanstack/react-query';
import type { Athlete, Consent } from '#shared/contracts/athletes.ts';
import { routes } from '#shared/contracts/routes.ts';
import { athletesKey } from '#src/api/athletes.queries.ts';
import { call } from '#src/api/client.ts';
import { useMay } from '#src/api/use-may.ts';
import { ConfirmButton } from '#src/ui/confirm.tsx';
import { longDay, moment } from '#src/ui/days.ts';
import { useStatus } from '#src/ui/status.tsx';
import { PURPOSE_WORDS } from '#src/ui/words.ts';
import { ConsentScan } from './consent-scan.tsx';

const giver = (consent: Consent, athlete: Athlete): string => {
  if (consent.givenBy === 'athlete') return `${athlete.givenName} ${athlete.familyName}`;
  const relation = consent.guardianRelation ? ` (${consent.guardianRelation})` : '';
  return `${consent.guardianName ?? 'a guardian'}${relation}`;
};

/** Who gave a consent, to which words, what was taken back since, and the paper. */
export function GivenConsent({ athlete, consent }: { athlete: Athlete; consent: Consent }) {
  const client = useQueryClient();
  const say = useStatus();
  const may = useMay(athlete.coach.id);
  const withdraw = async () => {
    await call(routes.withdrawConsent, { params: { id: consent.id } });
    await client.invalidateQueries({ queryKey: athletesKey });
    say('The consent is withdrawn.');
  };
  const unasked = consent.state === 'assent-missing';
  return (
    <li className="border-b border-rule py-2 text-note text-soft last:border-0">
      <p>
        Given by {giver(consent, athlete)} on {longDay(consent.validFrom)}
        {consent.assent && `; ${athlete.givenName} agreed too`}
        {consent.wording && `, to wording ${consent.wording.version}`}.{' '}
        {consent.how !== '' && `${consent.how.replace(/\.$/, '')}. `}
        Recorded by {consent.recordedBy.name}.
        {unasked && ` It does not count: ${athlete.givenName}’s own yes was not recorded.`}
      </p>
      {consent.withdrawals.map(({ purpose, at }) => (
        <p key={purpose}>
          {PURPOSE_WORDS[purpose]}: withdrawn {moment(at)}.
        </p>
      ))}
      <div className="flex flex-wrap items-center gap-x-6">
        <ConsentScan consent={consent} mayChange={may('consent.record')} />
        {unasked && may('consent.withdraw') && (
          <ConfirmButton
            look="plain"
            className="!text-alarm text-note"
            label="Withdraw"
            title="Withdraw this consent?"
            confirm="Withdraw it"
            onConfirm={withdraw}
          >
            <p>
              Nothing of {athlete.givenName} was allowed by it yet. What was filmed before is
              closed, and deleted after the days that the practice has set.
            </p>
          </ConfirmButton>
        )}
      </div>
    </li>
  );
}

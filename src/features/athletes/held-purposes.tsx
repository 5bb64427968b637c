import { useQueryClient } from '@tanstack/react-query';
import type { Athlete, Consent } from '#shared/contracts/athletes.ts';
import type { Purpose } from '#shared/contracts/consents.ts';
import { routes } from '#shared/contracts/routes.ts';
import { call } from '#src/api/client.ts';
import { useMay } from '#src/api/use-may.ts';
import { ConfirmButton } from '#src/ui/confirm.tsx';
import { longDay } from '#src/ui/days.ts';
import { StateDot } from '#src/ui/state-dot.tsx';
import { useStatus } from '#src/ui/status.tsx';
import { PURPOSES, PURPOSE_WORDS } from '#src/ui/words.ts';

/** Every purpose with until when it holds, and the way to take it back. */
export function HeldPurposes({
  athlete,
  consents,
}: {
  athlete: Athlete;
  consents: readonly Consent[];
}) {
  const may = useMay(athlete.coach.id);
  return (
    <ul>
      {PURPOSES.map((purpose) => {
        const until = consents
          .filter(({ held }) => held.includes(purpose))
          .map(({ validUntil }) => validUntil)
          .sort()
          .at(-1);
        return (
          <li
            key={purpose}
            className="flex flex-wrap items-center justify-between gap-x-6 border-b border-rule py-1"
          >
            <span className="min-w-0 flex-1 basis-64 py-1.5">{PURPOSE_WORDS[purpose]}</span>
            {until === undefined ? (
              <span className="py-1.5 text-soft">
                no{purpose === 'teaching' && ': not shown to learners'}
              </span>
            ) : (
              <>
                <StateDot kind="done">yes, until {longDay(until)}</StateDot>
                {may('consent.withdraw') && <Withdraw athlete={athlete} purpose={purpose} />}
              </>
            )}
          </li>
        );
      })}
    </ul>
  );
}

const WHAT_STOPS: Record<Purpose, (name: string) => string> = {
  assessment: (name) =>
    `From this moment every clip, mark and reading of ${name} is closed, for you too. Links die. All other purposes end with this one.`,
  supervision: (name) =>
    `From this moment no supervisor can open a clip, a mark or a reading of ${name}.`,
  teaching: (name) => `From this moment no clip of ${name} may be shown to learners.`,
  'sharing-by-link': (name) =>
    `From this moment no replay link of ${name} opens, and none comes to life again: new links need a new consent.`,
};

function Withdraw({ athlete, purpose }: { athlete: Athlete; purpose: Purpose }) {
  const client = useQueryClient();
  const say = useStatus();
  const withdraw = async () => {
    await call(routes.withdrawPurposes, {
      params: { id: athlete.id },
      body: { purposes: [purpose] },
    });
    say('Withdrawn. It holds from now on.');
    // clips, links and what waits today are asked for again as well
    await client.invalidateQueries();
  };
  const filming = purpose === 'assessment';
  return (
    <ConfirmButton
      look="plain"
      className="!text-alarm text-note"
      label={
        <>
          Withdraw<span className="sr-only">: {PURPOSE_WORDS[purpose]}</span>
        </>
      }
      title={filming ? 'Withdraw the consent to filming?' : 'Withdraw this purpose?'}
      confirm="Withdraw it"
      onConfirm={withdraw}
    >
      <p>{WHAT_STOPS[purpose](athlete.givenName)}</p>
      {filming && (
        <p className="mt-2">
          Everything about {athlete.givenName} is then deleted after the days that the practice has
          set; the day is shown here. Until then only a new consent takes it back.
        </p>
      )}
    </ConfirmButton>
  );
}

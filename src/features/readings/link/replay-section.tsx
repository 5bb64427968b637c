import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import type { SidePage } from '#shared/contracts/readings.ts';
import type { Replay } from '#shared/contracts/replays.ts';
import { athleteOptions } from '#src/api/athletes.queries.ts';
import { replaysOptions } from '#src/api/readings.queries.ts';
import { useLinkActs } from '#src/api/use-link-acts.ts';
import { useMay } from '#src/api/use-may.ts';
import { ButtonLink } from '#src/ui/button-link.tsx';
import { Section } from '#src/ui/page.tsx';
import { paths } from '#src/ui/paths.ts';
import { ReplayLinks } from '#src/ui/replay-links.tsx';
import { Empty, ErrorState, Loading } from '#src/ui/states.tsx';
import { useSideReps } from '../side-clips.ts';
import { LinkAddress, type MadeLink } from './link-address.tsx';
import { LinkForm } from './link-form.tsx';

/** The athlete's replay: make a link, hand its address over once, see whether it was opened, end it. */
export function ReplaySection({ page }: { page: SidePage }) {
  const { athlete, visit, side } = page;
  const person = useQuery(athleteOptions(athlete.id));
  const links = useQuery(replaysOptions(visit.id));
  const { reps, pending, error, retry } = useSideReps(visit.id, side);
  const [made, setMade] = useState<MadeLink | null>(null);
  const own = links.data?.items.filter((link) => link.side === side) ?? [];
  const failed = [person, links].find(({ isError, data }) => isError && !data);
  const may = useMay(person.data?.coach.id);
  const { end, hideAgain, makeFilm, saveFilm } = useLinkActs();
  const nameOf = ({ repId }: Replay) => {
    const rep = reps.find((named) => named.rep.id === repId)?.rep;
    return rep ? `rep ${rep.number}, ` : '';
  };
  const consented = person.data?.consentedTo.includes('sharing-by-link') ?? false;
  return (
    <Section
      id="replay"
      title="Replay for the athlete"
      note="One rep behind a link, in plain words."
      margin={
        <>
          <p>
            The link opens this one replay and nothing else of the practice. Whoever has it can open
            it until it lapses or you end it.
          </p>
          <p>A pass phrase is told by voice, not sent beside the link.</p>
        </>
      }
    >
      {failed || error ? (
        <ErrorState
          error={failed?.error ?? error}
          onRetry={() => (failed ? void failed.refetch() : retry())}
        />
      ) : !person.data || !links.data || pending ? (
        <Loading label="Loading the links" />
      ) : (
        <>
          {made && (
            <LinkAddress
              made={made}
              athlete={{ name: athlete.name, contactEmail: person.data.contactEmail }}
              onDone={() => setMade(null)}
            />
          )}
          {!may('replay.make') ? (
            own.length === 0 && <p className="text-soft">No link was made. The coach makes them.</p>
          ) : !consented ? (
            <Empty
              title="There is no consent to a replay by link"
              action={<ButtonLink to={paths.newConsent(athlete.id)}>Record the consent</ButtonLink>}
            >
              {athlete.name} has not agreed to ‘A replay behind a link, for the athlete’, or that
              consent has ended. Links that were made are dead until it is given again.
            </Empty>
          ) : reps.length === 0 ? (
            <Empty title="No rep of this side is named yet">
              A replay plays one rep. Open a clip on the Bench and name its reps first.
            </Empty>
          ) : (
            !made && <LinkForm page={page} reps={reps} onMade={setMade} />
          )}
          {own.length > 0 && (
            <div className="mt-8">
              <h3 className="font-bold">Links that were made</h3>
              <ReplayLinks
                links={own}
                nameOf={nameOf}
                onEnd={may('replay.revoke') ? end : undefined}
                onHideAgain={may('replay.make') ? hideAgain : undefined}
                film={{
                  onSave: saveFilm,
                  onMake: consented && may('replay.make') ? makeFilm : undefined,
                }}
              />
            </div>
          )}
        </>
      )}
    </Section>
  );
}

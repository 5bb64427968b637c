import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import type { Athlete } from '#shared/contracts/athletes.ts';
import { athleteLinksOptions, athleteVisitsOptions } from '#src/api/athletes.queries.ts';
import { useLinkActs } from '#src/api/use-link-acts.ts';
import { useMay } from '#src/api/use-may.ts';
import { shortDay } from '#src/ui/days.ts';
import { Section } from '#src/ui/page.tsx';
import { paths } from '#src/ui/paths.ts';
import { ReplayLinks } from '#src/ui/replay-links.tsx';
import { Empty, ErrorState, Loading, SkeletonLines } from '#src/ui/states.tsx';

/** Every replay link of this athlete, over all visits: who could still open one, and the way to end it. */
export function LinksSection({ athlete }: { athlete: Athlete }) {
  const links = useQuery(athleteLinksOptions(athlete.id));
  const visits = useQuery(athleteVisitsOptions(athlete.id));
  const may = useMay(athlete.coach.id);
  const { end, hideAgain, makeFilm, saveFilm } = useLinkActs();
  const shared = athlete.consentedTo.includes('sharing-by-link');
  const open = links.data?.items.some(({ state }) => state === 'live') ?? false;
  return (
    <Section
      id="links"
      title="Links"
      note="Replays that were given to the athlete."
      margin={<p>Whoever has a link can open it until it lapses or is ended.</p>}
    >
      {links.isError && !links.data && (
        <ErrorState error={links.error} onRetry={() => void links.refetch()} />
      )}
      {links.isPending && (
        <Loading label="Loading the links">
          <SkeletonLines count={2} />
        </Loading>
      )}
      {links.data?.items.length === 0 && (
        <Empty title="No link was made yet">
          A link is made on the reading of one side: it shows {athlete.givenName} one rep in plain
          words.
        </Empty>
      )}
      {open && !shared && (
        <p className="mb-3 max-w-lead">
          There is no valid consent to sharing by link: none of these opens until it is given again.
        </p>
      )}
      {links.data && links.data.items.length > 0 && (
        <ReplayLinks
          links={links.data.items}
          nameOf={({ visitId, side }) => {
            const day = visits.data?.items.find((visit) => visit.id === visitId)?.day;
            return (
              <>
                <Link to={`${paths.reading(visitId, side)}#replay`} className="tap">
                  {side} support{day === undefined ? '' : `, ${shortDay(day)}`}
                </Link>
                ,{' '}
              </>
            );
          }}
          onEnd={may('replay.revoke') ? end : undefined}
          onHideAgain={may('replay.make') ? hideAgain : undefined}
          film={{ onSave: saveFilm, onMake: shared && may('replay.make') ? makeFilm : undefined }}
        />
      )}
    </Section>
  );
}

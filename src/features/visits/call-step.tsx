import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import type { Clip } from '#shared/contracts/clips.ts';
import type { Side } from '#shared/contracts/primitives.ts';
import type { Visit } from '#shared/contracts/visits.ts';
import { callsOptions } from '#src/api/readings.queries.ts';
import type { May } from '#src/api/use-may.ts';
import { moment } from '#src/ui/days.ts';
import { Section } from '#src/ui/page.tsx';
import { paths } from '#src/ui/paths.ts';
import { StateDot } from '#src/ui/state-dot.tsx';
import { ErrorState, Loading, Skeleton } from '#src/ui/states.tsx';
import { SEEN_WORDS } from '#src/ui/words.ts';
import { sidesOf } from './sides-of.ts';

/** What the coach saw, before any figure: one call for each side that was filmed. */
export function CallStep({
  visit,
  clips,
  may,
}: {
  visit: Visit;
  clips: readonly Clip[];
  may: May;
}) {
  const sides = sidesOf(clips);
  return (
    <Section
      id="call"
      title="5 Call by eye"
      margin={
        <p>
          It stands on its own on a day without pointers, always labelled as seen, not measured.
        </p>
      }
    >
      <p className="max-w-lead">
        Say what you saw before any figure is shown. One call for each side; it stays as it was
        given.
      </p>
      {sides.length === 0 ? (
        <p className="mt-2 text-soft">First a clip.</p>
      ) : (
        <ul className="mt-3">
          {sides.map((side) => (
            <SideCall key={side} visitId={visit.id} side={side} mayCall={may('call.record')} />
          ))}
        </ul>
      )}
    </Section>
  );
}

function SideCall({ visitId, side, mayCall }: { visitId: string; side: Side; mayCall: boolean }) {
  const calls = useQuery(callsOptions(visitId, side));
  const latest = calls.data?.items.at(-1);
  return (
    <li className="flex flex-wrap items-center justify-between gap-x-6 border-b border-rule py-2.5 last:border-0">
      <span className="font-bold">Standing on the {side}</span>
      {calls.isPending && (
        <Loading label="Loading the call">
          <Skeleton className="h-6 w-40" />
        </Loading>
      )}
      {calls.isError && !calls.data && (
        <ErrorState error={calls.error} onRetry={() => void calls.refetch()} />
      )}
      {latest && (
        <>
          <StateDot kind="done" wrap>
            {SEEN_WORDS[latest.seen]}, by {latest.by.name}, {moment(latest.at)}
          </StateDot>
          <Link to={paths.reading(visitId, side)} className="tap">
            Open the reading
          </Link>
        </>
      )}
      {calls.data && !latest && !mayCall && <span className="text-soft">not made yet</span>}
      {calls.data && !latest && mayCall && (
        <Link to={paths.call(visitId, side)} className="tap">
          Make the call
        </Link>
      )}
    </li>
  );
}

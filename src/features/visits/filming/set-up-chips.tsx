import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import type { SetUp, Visit } from '#shared/contracts/visits.ts';
import { setUpsQuery } from '#src/api/visits.queries.ts';
import { cx } from '#src/ui/class-names.ts';
import { shortDay } from '#src/ui/days.ts';
import { paths } from '#src/ui/paths.ts';
import { ErrorState, Loading, Skeleton } from '#src/ui/states.tsx';
import { useStatus } from '#src/ui/status.tsx';
import { useVisitEdit } from '../use-visit-edit.ts';

/** So many stand on the page; the rest is on the page of set-ups. */
const SHOWN = 5;

/** The practice's saved ways of filming; one touch fills all figures of this visit. */
export function SetUpChips({ visit }: { visit: Visit }) {
  const setUps = useQuery(setUpsQuery);
  const edit = useVisitEdit(visit);
  const say = useStatus();
  if (setUps.isPending)
    return (
      <Loading label="Loading set-ups">
        <Skeleton className="h-[60px] w-72 max-w-full" />
      </Loading>
    );
  if (!setUps.data)
    return <ErrorState error={setUps.error} onRetry={() => void setUps.refetch()} />;
  const { items } = setUps.data;
  if (items.length === 0)
    return (
      <p className="max-w-lead text-soft">
        No set-up is saved yet. Write the figures down once, save them as a set-up, and the next
        visit takes them in one touch.
      </p>
    );
  const take = (setUp: SetUp) =>
    edit.mutate({ setUpId: setUp.id }, { onSuccess: () => say(`Filmed as in “${setUp.name}”.`) });
  return (
    <>
      <div className="flex flex-wrap items-center gap-3">
        {items.slice(0, SHOWN).map((setUp) => (
          <Chip
            key={setUp.id}
            setUp={setUp}
            pressed={visit.setUpName === setUp.name}
            onClick={() => take(setUp)}
          />
        ))}
        {items.length > SHOWN && <Link to={paths.setUps()}>All {items.length} set-ups</Link>}
      </div>
      {edit.isError && (
        <div className="mt-4">
          <ErrorState error={edit.error} />
        </div>
      )}
    </>
  );
}

function Chip({
  setUp,
  pressed,
  onClick,
}: {
  setUp: SetUp;
  pressed: boolean;
  onClick: () => void;
}) {
  return (
    <button
      type="button"
      aria-pressed={pressed}
      onClick={onClick}
      className={cx(
        'min-h-[44px] rounded text-left text-note leading-5',
        pressed
          ? 'border-2 border-ink bg-sheet px-[15px] py-[7px]'
          : 'border border-edge px-4 py-2 hover:bg-sheet',
      )}
    >
      <b className="block text-body leading-[22px]">{setUp.name}</b>
      <span className="text-soft">
        {pressed
          ? 'distance, lens height, rod and pointers are filled'
          : setUp.lastUsed === null
            ? 'not used yet'
            : `last used ${shortDay(setUp.lastUsed)}`}
      </span>
    </button>
  );
}

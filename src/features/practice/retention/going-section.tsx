import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import type { GoingAthlete } from '#shared/contracts/retention.ts';
import { previewOptions } from '#src/api/retention.queries.ts';
import { longDay, today, yearsOn } from '#src/ui/days.ts';
import { Section } from '#src/ui/page.tsx';
import { paths } from '#src/ui/paths.ts';
import { Empty, ErrorState, Loading } from '#src/ui/states.tsx';
import { Table, type Column } from '#src/ui/table.tsx';
import { PersonActions } from './person-actions.tsx';
import { heldWords } from './retention-words.ts';

const COLUMNS: Column<GoingAthlete>[] = [
  {
    key: 'athlete',
    label: 'Athlete',
    cell: ({ athlete }) => <Link to={paths.athlete(athlete.id)}>{athlete.name}</Link>,
  },
  {
    key: 'on',
    label: 'Goes on',
    cell: ({ on, why }) => (
      <>
        {on <= today() ? 'today' : longDay(on)}
        <span className="text-soft">
          , {why === 'withdrawn' ? 'filming withdrawn' : 'term ends'}
        </span>
      </>
    ),
  },
  { key: 'held', label: 'With', cell: heldWords },
  {
    key: 'actions',
    label: 'Export or erase',
    end: true,
    cell: ({ athlete }) => <PersonActions athlete={athlete} />,
  },
];

/** Who goes within a year, by the term as it is typed: the daily run deletes exactly these, each on their day. */
export function GoingSection({ keepMonths, saved }: { keepMonths: number | null; saved: boolean }) {
  const until = yearsOn(today(), 1);
  const going = useQuery(previewOptions(keepMonths ?? 0, until));
  const due = going.data?.items.filter(({ on }) => on <= today()).length ?? 0;
  return (
    <Section
      title="What goes"
      wide
      note={saved ? 'Within a year from today.' : 'Within a year, if the term above is set.'}
    >
      {going.isPending && <Loading label="Looking who goes" />}
      {going.isError && !going.data && (
        <ErrorState error={going.error} onRetry={() => void going.refetch()} />
      )}
      {going.data?.items.length === 0 && (
        <Empty title="Nobody goes within a year">
          {keepMonths === null
            ? 'No term is set, and nobody has withdrawn the consent to filming.'
            : 'Every athlete was here lately enough.'}
        </Empty>
      )}
      {going.data && going.data.items.length > 0 && (
        <>
          {due > 0 && (
            <p className="mb-3 max-w-lead font-bold text-alarm">
              {due} {due === 1 ? 'athlete goes' : 'athletes go'} today
              {saved ? ', within the hour.' : ' as soon as this term is set.'}
            </p>
          )}
          <Table
            caption="Athletes who go within a year"
            columns={COLUMNS}
            rows={going.data.items}
            rowKey={({ athlete }) => athlete.id}
          />
        </>
      )}
    </Section>
  );
}

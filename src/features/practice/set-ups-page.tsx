import { useQuery, useQueryClient } from '@tanstack/react-query';
import { routes } from '#shared/contracts/routes.ts';
import type { SetUp } from '#shared/contracts/visits.ts';
import { call } from '#src/api/client.ts';
import { setUpsQuery } from '#src/api/visits.queries.ts';
import { ButtonLink } from '#src/ui/button-link.tsx';
import { ConfirmButton } from '#src/ui/confirm.tsx';
import { shortDay } from '#src/ui/days.ts';
import { metres } from '#src/ui/figures.ts';
import { Page } from '#src/ui/page.tsx';
import { paths } from '#src/ui/paths.ts';
import { Empty, ErrorState, Loading } from '#src/ui/states.tsx';
import { useStatus } from '#src/ui/status.tsx';
import { Table, type Column } from '#src/ui/table.tsx';

/** The practice's saved ways of filming. They are saved from a visit, where their figures were used. */
export function SetUpsPage() {
  const setUps = useQuery(setUpsQuery);
  return (
    <Page
      title="Set-ups"
      crumbs={[{ label: 'Practice', to: paths.practice() }, { label: 'set-ups' }]}
      lead="Saved ways of filming. One touch in a visit fills distance, lens height, rod and pointers."
    >
      {setUps.isPending && <Loading label="Loading set-ups" />}
      {setUps.isError && !setUps.data && (
        <ErrorState error={setUps.error} onRetry={() => void setUps.refetch()} />
      )}
      {setUps.data &&
        (setUps.data.items.length > 0 ? (
          <Table
            caption="Set-ups"
            columns={COLUMNS}
            rows={setUps.data.items}
            rowKey={({ id }) => id}
          />
        ) : (
          <Empty
            title="No set-up yet"
            action={<ButtonLink to={paths.athletes()}>Choose an athlete for a visit</ButtonLink>}
          >
            In a visit, write the figures down once and save them as a set-up.
          </Empty>
        ))}
    </Page>
  );
}

const orNone = (mm: number | null, write: (mm: number) => string) =>
  mm === null ? <span className="text-soft">not measured</span> : write(mm);
const inMm = (mm: number) => `${Math.round(mm)} mm`;
/** On a narrow page the headings are gone, so each figure says what it is. */
const named = (name: string) => <span className="text-soft tablet:hidden">{name} </span>;

const COLUMNS: Column<SetUp>[] = [
  {
    key: 'name',
    label: 'Set-up',
    cell: ({ name, lastUsed }) => (
      <>
        <b>{name}</b>
        <span className="block text-note text-soft">
          {lastUsed === null ? 'not used yet' : `last used ${shortDay(lastUsed)}`}
        </span>
      </>
    ),
  },
  {
    key: 'distance',
    label: 'Distance',
    cell: (own) => (
      <>
        {named('distance')}
        {metres(own.distanceMm)}
      </>
    ),
  },
  {
    key: 'lens',
    label: 'Lens height',
    cell: (own) => (
      <>
        {named('lens')}
        {orNone(own.lensHeightMm, metres)}
      </>
    ),
  },
  {
    key: 'rod',
    label: 'Rod',
    cell: (own) => (
      <>
        {named('rod')}
        {orNone(own.rodMm, metres)}
      </>
    ),
  },
  {
    key: 'belt',
    label: 'Belt pointer',
    cell: (own) => (
      <>
        {named('belt pointer')}
        {orNone(own.beltPointerMm, inMm)}
      </>
    ),
  },
  {
    key: 'thigh',
    label: 'Thigh pointer',
    cell: (own) => (
      <>
        {named('thigh pointer')}
        {orNone(own.thighPointerMm, inMm)}
      </>
    ),
  },
  {
    key: 'delete',
    label: 'Delete',
    heading: <span className="sr-only">Delete</span>,
    end: true,
    cell: (own) => <Delete setUp={own} />,
  },
];

function Delete({ setUp }: { setUp: SetUp }) {
  const client = useQueryClient();
  const say = useStatus();
  return (
    <ConfirmButton
      look="plain"
      className="-my-2.5 !text-alarm"
      label="Delete"
      title={`Delete “${setUp.name}”?`}
      confirm="Delete it"
      onConfirm={async () => {
        await call(routes.deleteSetUp, { params: { id: setUp.id } });
        await client.invalidateQueries({ queryKey: setUpsQuery.queryKey });
        say(`“${setUp.name}” is deleted.`);
      }}
    >
      <p>Visits filmed with it keep their figures.</p>
    </ConfirmButton>
  );
}

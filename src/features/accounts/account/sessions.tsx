import { useQuery, useQueryClient } from '@tanstack/react-query';
import type { SessionRow } from '#shared/contracts/accounts.ts';
import { routes } from '#shared/contracts/routes.ts';
import { sessionsQuery } from '#src/api/accounts.queries.ts';
import { call } from '#src/api/client.ts';
import { ConfirmButton } from '#src/ui/confirm.tsx';
import { dayOf } from '#src/ui/days.ts';
import { ErrorState, Loading } from '#src/ui/states.tsx';
import { useStatus } from '#src/ui/status.tsx';
import { Table, type Column } from '#src/ui/table.tsx';

/** Where one is signed in, last used first. */
export function Sessions() {
  const sessions = useQuery(sessionsQuery);
  if (sessions.data)
    return (
      <Table
        caption="Where you are signed in"
        columns={COLUMNS}
        rows={sessions.data.items}
        rowKey={({ id }) => id}
      />
    );
  return sessions.isError ? (
    <ErrorState error={sessions.error} onRetry={() => void sessions.refetch()} />
  ) : (
    <Loading label="Loading where you are signed in" />
  );
}

const COLUMNS: Column<SessionRow>[] = [
  {
    key: 'device',
    label: 'Device',
    cell: ({ device, current }) => (
      <>
        <b>{device}</b>
        {current && <span className="block text-note text-soft">this one</span>}
      </>
    ),
  },
  {
    key: 'since',
    label: 'Signed in',
    cell: ({ createdAt }) => (
      <>
        <span className="text-soft tablet:hidden">since </span>
        {dayOf(createdAt)}
      </>
    ),
  },
  {
    key: 'seen',
    label: 'Last used',
    cell: ({ lastSeenAt }) => (
      <>
        <span className="text-soft tablet:hidden">last used </span>
        {dayOf(lastSeenAt)}
      </>
    ),
  },
  {
    key: 'end',
    label: 'End',
    heading: <span className="sr-only">End</span>,
    end: true,
    cell: (row) => (row.current ? null : <SignOutThere row={row} />),
  },
];

function SignOutThere({ row: { id, device } }: { row: SessionRow }) {
  const client = useQueryClient();
  const say = useStatus();
  return (
    <ConfirmButton
      look="plain"
      className="-my-2.5 !text-alarm"
      label={
        <>
          Sign out there<span className="sr-only">: {device}</span>
        </>
      }
      title={`Sign out on ${device}?`}
      confirm="Sign out there"
      onConfirm={async () => {
        await call(routes.endSession, { params: { id } });
        await client.invalidateQueries({ queryKey: sessionsQuery.queryKey });
        say(`You are signed out on ${device}.`);
      }}
    >
      <p>Marks that were not sent from there are lost.</p>
    </ConfirmButton>
  );
}

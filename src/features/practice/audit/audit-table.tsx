import { Link } from 'react-router-dom';
import { AUDIT_ACTIONS } from '#shared/contracts/audit-actions.ts';
import type { AuditEntry } from '#shared/contracts/audit.ts';
import { moment } from '#src/ui/days.ts';
import { paths } from '#src/ui/paths.ts';
import { type Column, Table } from '#src/ui/table.tsx';
import { detailWords, nameWords, placeOf, whoWords } from './audit-words.ts';

export function AuditTable({ entries }: { entries: readonly AuditEntry[] }) {
  return (
    <Table
      caption="What was done, newest first"
      columns={COLUMNS}
      rows={entries}
      rowKey={({ id }) => id}
    />
  );
}

/** What it was done to, as long as it is there, and the details that say something. */
function DoneTo({ entry }: { entry: AuditEntry }) {
  const to = placeOf(entry);
  const { id, kind } = entry.subject;
  const shown = kind === 'account' && id === entry.by?.id ? null : nameWords(entry);
  const details = detailWords(entry);
  if (shown === null && details === '') return null;
  return (
    <span className="block break-words text-note font-normal text-soft">
      {shown !== null && (to === null ? shown : <Link to={to}>{shown}</Link>)}
      {shown !== null && details !== '' && ': '}
      {details}
    </span>
  );
}

const COLUMNS: Column<AuditEntry>[] = [
  {
    key: 'what',
    label: 'What',
    cell: (entry) => (
      <>
        <b>{AUDIT_ACTIONS[entry.action][1]}</b>
        <DoneTo entry={entry} />
      </>
    ),
  },
  {
    key: 'athlete',
    label: 'Athlete',
    cell: ({ athlete }) => {
      if (athlete === null) return null;
      if (athlete.name === null) return <span className="text-soft">no longer here</span>;
      return <Link to={paths.athlete(athlete.id)}>{athlete.name}</Link>;
    },
  },
  {
    key: 'who',
    label: 'Who',
    cell: (entry) => (
      <>
        {whoWords(entry)}
        {entry.role !== null && (
          <span className="text-note text-soft tablet:block"> {entry.role}</span>
        )}
      </>
    ),
  },
  { key: 'when', label: 'When', cell: ({ at }) => <time dateTime={at}>{moment(at)}</time> },
  {
    key: 'from',
    label: 'Network',
    end: true,
    cell: ({ network }) =>
      network === null ? null : <span className="text-note text-soft">{network}</span>,
  },
];

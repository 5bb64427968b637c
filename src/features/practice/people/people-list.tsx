import type { Person } from '#shared/contracts/people.ts';
import { dayOf } from '#src/ui/days.ts';
import { Table, type Column } from '#src/ui/table.tsx';
import { PersonActs } from './person-acts.tsx';
import { roleLabel } from './role-words.ts';

export function PeopleList({ people }: { people: readonly Person[] }) {
  const names = new Map(people.map(({ id, name }) => [id, name]));
  const columns: Column<Person>[] = [
    {
      key: 'name',
      label: 'Name',
      cell: ({ name, email, deactivatedAt }) => (
        <>
          <b>{name}</b>
          {deactivatedAt !== null && (
            <span className="text-soft"> deactivated {dayOf(deactivatedAt)}</span>
          )}
          <span className="block break-words text-note text-soft">{email}</span>
        </>
      ),
    },
    {
      key: 'role',
      label: 'Role',
      cell: ({ role, coachIds }) => (
        <>
          {roleLabel(role)}
          {role === 'supervisor' && (
            <span className="block text-note text-soft">
              {coachIds.length === 0
                ? 'of nobody yet'
                : `of ${coachIds.map((id) => names.get(id) ?? 'somebody').join(', ')}`}
            </span>
          )}
        </>
      ),
    },
    {
      key: 'athletes',
      label: 'Athletes',
      cell: ({ athletes }) => (
        <>
          {athletes}
          <span className="text-soft tablet:hidden"> athletes</span>
        </>
      ),
    },
    {
      key: 'seen',
      label: 'Last here',
      cell: ({ lastSeenAt }) =>
        lastSeenAt === null ? (
          <span className="text-soft">never here</span>
        ) : (
          <>
            <span className="text-soft tablet:hidden">last here </span>
            {dayOf(lastSeenAt)}
          </>
        ),
    },
    {
      key: 'acts',
      label: 'Change',
      heading: <span className="sr-only">Change</span>,
      end: true,
      cell: (person) => <PersonActs person={person} people={people} />,
    },
  ];
  return <Table caption="People" columns={columns} rows={people} rowKey={({ id }) => id} />;
}

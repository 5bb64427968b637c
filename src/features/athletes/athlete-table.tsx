import { Link } from 'react-router-dom';
import type { Athlete } from '#shared/contracts/athletes.ts';
import { shortDay } from '#src/ui/days.ts';
import { paths } from '#src/ui/paths.ts';
import { Table, type Column } from '#src/ui/table.tsx';
import { ConsentState } from './consent-state.tsx';
import { fullName } from './athlete-words.ts';

export function AthleteTable({
  athletes,
  showCoach,
  coachAddress,
}: {
  athletes: readonly Athlete[];
  showCoach: boolean;
  coachAddress: (coachId: string) => string;
}) {
  const columns: Column<Athlete>[] = [
    {
      key: 'name',
      label: 'Athlete',
      cell: (athlete) => (
        <>
          <Link to={paths.athlete(athlete.id)} className="tap font-bold">
            {fullName(athlete)}
          </Link>
          <span className="block text-note text-soft">
            {[`born ${athlete.birthDate.slice(0, 4)}`, athlete.sport].filter(Boolean).join(', ')}
          </span>
        </>
      ),
    },
    {
      key: 'visit',
      label: 'Visits',
      cell: ({ visitCount, lastVisit }) =>
        lastVisit === null ? (
          <span className="text-soft">no visit yet</span>
        ) : (
          <>
            {visitCount === 1 ? '1 visit' : `${visitCount} visits`}
            <span className="text-soft tablet:block tablet:text-note">
              <span className="tablet:hidden">, </span>last on {shortDay(lastVisit)}
            </span>
          </>
        ),
    },
    {
      key: 'consent',
      label: 'Consent to filming',
      cell: (athlete) => <ConsentState athlete={athlete} />,
    },
  ];
  if (showCoach)
    columns.splice(2, 0, {
      key: 'coach',
      label: 'Coach',
      cell: ({ coach }) => (
        <Link
          to={coachAddress(coach.id)}
          className="tap"
          aria-label={`${coach.name}: only their athletes`}
        >
          {coach.name}
        </Link>
      ),
    });
  return (
    <Table caption="Athletes" columns={columns} rows={athletes} rowKey={(athlete) => athlete.id} />
  );
}

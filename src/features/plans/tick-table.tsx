import type { Plan } from '#shared/contracts/plans.ts';
import { dayBack, shortDay } from '#src/ui/days.ts';

const DAYS = 14;

/** The last two weeks, a dot for each day on which an exercise was ticked off, beside what was asked. */
export function TickTable({ plan: { given, ticks } }: { plan: Plan }) {
  const running = given.find(({ plan }) => plan !== null)?.plan;
  const items = running?.items ?? [];
  if (items.length === 0) return <p className="text-soft">No exercise was given.</p>;
  const days = Array.from({ length: DAYS }, (_, n) => dayBack(DAYS - 1 - n));
  return (
    <ul>
      {items.map(({ exercise, name, dose }) => {
        const done = new Set(
          ticks.filter((tick) => tick.exercise === exercise).map(({ day }) => day),
        );
        const shown = days.filter((day) => done.has(day));
        return (
          <li
            key={exercise}
            className="grid gap-x-6 border-b border-rule py-2 first:pt-0 last:border-0 phone:grid-cols-[minmax(0,1fr)_auto]"
          >
            <span>
              {name}{' '}
              <span className="text-soft">
                {shown.length} of the last {DAYS} days, {dose.daysPerWeek} a week asked
              </span>
            </span>
            <svg
              width={DAYS * 12}
              height="24"
              viewBox={`0 0 ${DAYS * 12} 24`}
              role="img"
              aria-label={
                shown.length === 0
                  ? 'no day'
                  : `done on ${shown.map((day) => shortDay(day)).join(', ')}`
              }
            >
              {days.map((day, n) => (
                <circle
                  key={day}
                  cx={6 + n * 12}
                  cy="12"
                  r={done.has(day) ? 4.5 : 1.5}
                  className={done.has(day) ? 'fill-reed' : 'fill-edge'}
                />
              ))}
            </svg>
          </li>
        );
      })}
    </ul>
  );
}

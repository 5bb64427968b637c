import { useQuery } from '@tanstack/react-query';
import { useId } from 'react';
import { Link, useSearchParams } from 'react-router-dom';
import { athleteListOptions } from '#src/api/athletes.queries.ts';
import { FIELD_BOX } from '#src/ui/form/field-frame.tsx';
import { Section } from '#src/ui/page.tsx';
import { paths } from '#src/ui/paths.ts';
import { ErrorState, Loading } from '#src/ui/states.tsx';
import { PersonActions } from './person-actions.tsx';

const SHOWN = 10;

/** Finds one athlete by name, to export or erase everything of them. */
export function OnePerson() {
  const id = useId();
  const [search, setSearch] = useSearchParams();
  const q = search.get('q') ?? '';
  const found = useQuery({
    ...athleteListOptions({ q, pageSize: SHOWN }),
    enabled: q.trim() !== '',
  });
  return (
    <Section
      title="One person"
      id="one-person"
      margin={
        <p>
          An export is a ZIP in open formats: clips as they were sent, marks, readings, comments,
          consents with their scans.
        </p>
      }
    >
      <label htmlFor={id} className="font-bold">
        Name of the athlete
      </label>
      <input
        id={id}
        type="search"
        value={q}
        autoComplete="off"
        className={`${FIELD_BOX} max-w-form`}
        onChange={(event) =>
          setSearch(event.target.value === '' ? {} : { q: event.target.value }, { replace: true })
        }
      />
      <div className="mt-3" aria-live="polite">
        {q.trim() !== '' && found.isPending && <Loading label="Searching" />}
        {found.isError && <ErrorState error={found.error} onRetry={() => void found.refetch()} />}
        {q.trim() !== '' && found.data?.items.length === 0 && (
          <p className="text-soft">Nobody of this name.</p>
        )}
        {q.trim() !== '' && found.data && found.data.items.length > 0 && (
          <ul>
            {found.data.items.map(({ id: athleteId, givenName, familyName, birthDate }) => (
              <li
                key={athleteId}
                className="flex flex-wrap items-center justify-between gap-x-6 border-b border-rule"
              >
                <span className="py-2">
                  <Link to={paths.athlete(athleteId)}>
                    {givenName} {familyName}
                  </Link>
                  <span className="text-soft">, born {birthDate.slice(0, 4)}</span>
                </span>
                <PersonActions athlete={{ id: athleteId, name: `${givenName} ${familyName}` }} />
              </li>
            ))}
          </ul>
        )}
      </div>
    </Section>
  );
}

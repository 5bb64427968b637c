import { useQuery } from '@tanstack/react-query';
import { Link, useNavigate } from 'react-router-dom';
import { athleteOptions, athleteVisitsOptions } from '#src/api/athletes.queries.ts';
import { ButtonLink } from '#src/ui/button-link.tsx';
import { Section } from '#src/ui/page.tsx';
import { paths } from '#src/ui/paths.ts';
import { Empty, ErrorState, Loading } from '#src/ui/states.tsx';
import { type End, endText } from '../ends.ts';
import { EndField } from './end-field.tsx';
import { measuredSides, suggestions } from './suggestions.ts';

/** Which two: from the athlete's measured sides, with the pairs that are asked for most. */
export function Choice({
  athleteId,
  first,
  second,
}: {
  athleteId: string;
  first: End | null;
  second: End | null;
}) {
  const athlete = useQuery(athleteOptions(athleteId));
  const visits = useQuery(athleteVisitsOptions(athleteId));
  const navigate = useNavigate();
  const failed = [athlete, visits].find(({ isError, data }) => isError && !data);
  const name = athlete.data ? `${athlete.data.givenName} ${athlete.data.familyName}` : '';
  const sides = measuredSides(visits.data?.items ?? []);
  const choose = (change: { first?: End; second?: End }) => {
    const [one, other] = [change.first ?? first, change.second ?? second];
    void navigate(
      paths.compare({
        athlete: athleteId,
        ...(one ? { first: endText(one) } : {}),
        ...(other ? { second: endText(other) } : {}),
      }),
      { replace: true },
    );
  };
  return (
    <Section
      title="Which two"
      note={athlete.data && <Link to={paths.athlete(athleteId)}>{name}</Link>}
      wide
      first
    >
      {failed ? (
        <ErrorState error={failed.error} onRetry={() => void failed.refetch()} />
      ) : !athlete.data || !visits.data ? (
        <Loading label="Loading the visits" />
      ) : sides.length === 0 ? (
        <Empty
          title="Nothing measured yet"
          action={<ButtonLink to={paths.athlete(athleteId)}>Open {name}</ButtonLink>}
        >
          Two reps are matched by their lift, so each needs a reading: a call by eye first, then
          marked reps.
        </Empty>
      ) : (
        <>
          <div className="grid gap-6 tablet:grid-cols-2">
            <EndField
              label="First, a full line"
              sides={sides}
              end={first}
              onChange={(end) => choose({ first: end })}
            />
            <EndField
              label="Second, a dashed line"
              sides={sides}
              end={second}
              onChange={(end) => choose({ second: end })}
            />
          </div>
          {(!first || !second) && (
            <ul className="mt-5">
              {suggestions(sides).map(({ words, first: one, second: other }) => (
                <li key={words} className="border-b border-rule last:border-0">
                  <Link
                    className="inline-block py-2.5"
                    to={paths.compare({
                      athlete: athleteId,
                      first: endText(one),
                      second: endText(other),
                    })}
                  >
                    {words}
                  </Link>
                </li>
              ))}
            </ul>
          )}
        </>
      )}
    </Section>
  );
}

import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import type { Reliability } from '#shared/contracts/reliability.ts';
import { reliabilityOptions } from '#src/api/reliability.queries.ts';
import { decimal } from '#src/ui/figures.ts';
import { Section } from '#src/ui/page.tsx';
import { paths } from '#src/ui/paths.ts';
import { ErrorState, Loading } from '#src/ui/states.tsx';

type Person = Reliability['people'][number];

const errorWords = ({ px, fromFrames, frames }: Person, least: number): string =>
  fromFrames > 0
    ? `${decimal(px)} px, from ${fromFrames} frames marked twice`
    : `${decimal(px, 0)} px, assumed: ${frames} of ${least} frames marked twice`;

/** How well hands repeat, in one line a person; the whole stands on the reliability page. */
export function MarkedAgain() {
  const reliability = useQuery(reliabilityOptions());
  const { data } = reliability;
  return (
    <Section
      title="How well marks repeat"
      note="Same frames marked twice, unseen."
      margin={
        <p>
          <Link to={paths.reliability()} className="inline-block py-1">
            All agreement figures
          </Link>
        </p>
      }
    >
      {reliability.isPending && <Loading label="Loading how well marks repeat" />}
      {reliability.isError && !data && (
        <ErrorState error={reliability.error} onRetry={() => void reliability.refetch()} />
      )}
      {data && (
        <ul>
          {data.people.map((person) => (
            <li
              key={person.person.id}
              className="flex flex-wrap justify-between gap-x-6 border-b border-rule py-2.5 last:border-0"
            >
              <b>{person.person.name}</b>
              <span className="text-soft">{errorWords(person, data.least)}</span>
            </li>
          ))}
        </ul>
      )}
      {data && data.waiting.length > 0 && (
        <ul className="mt-4" aria-label="Second markings that wait for you">
          {data.waiting.map(({ summary, athlete }) => (
            <li key={summary.id}>
              <Link to={paths.secondMarking(summary.id)} className="inline-block py-2.5">
                Mark {athlete.name} again, blind: {summary.framesDone} of {summary.frames} frames
                done
              </Link>
            </li>
          ))}
        </ul>
      )}
    </Section>
  );
}

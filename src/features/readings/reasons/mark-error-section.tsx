import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import type { Reading, SidePage } from '#shared/contracts/readings.ts';
import { routes } from '#shared/contracts/routes.ts';
import { athleteOptions } from '#src/api/athletes.queries.ts';
import { call } from '#src/api/client.ts';
import { useMe } from '#src/api/me.ts';
import { sideReadingOptions, sidesKey } from '#src/api/readings.queries.ts';
import { useMay } from '#src/api/use-may.ts';
import { Button } from '#src/ui/button.tsx';
import { capital } from '#src/ui/figures.ts';
import { markErrorWords } from '#src/ui/mark-error-words.ts';
import { Section } from '#src/ui/page.tsx';
import { paths } from '#src/ui/paths.ts';
import { ErrorState } from '#src/ui/states.tsx';
import { useStatus } from '#src/ui/status.tsx';

/** The marking error that this reading was made with, and another that it could be made with now. */
export function MarkErrorSection({ page, reading }: { page: SidePage; reading: Reading }) {
  const { user } = useMe();
  const client = useQueryClient();
  const say = useStatus();
  const { newerMarkError: newer, visit, side, athlete } = page;
  const person = useQuery(athleteOptions(athlete.id));
  const may = useMay(person.data?.coach.id);
  const whose = reading.by.id === user.id ? 'your own' : 'own';
  const again = useMutation({
    mutationFn: () => call(routes.renewReading, { params: { id: visit.id, side } }),
    onSuccess: (answer) => {
      client.setQueryData(sideReadingOptions(visit.id, side).queryKey, answer);
      say('Read again. The earlier reading stays in the history.');
      return client.invalidateQueries({ queryKey: sidesKey(visit.id), refetchType: 'none' });
    },
  });
  return (
    <Section
      title="Marking error"
      margin={
        <p>
          Of one anatomical mark, in pixels of the phone’s picture. It is part of every ±.{' '}
          <Link to={paths.reliability()}>Reliability</Link>
        </p>
      }
    >
      <p>{capital(markErrorWords(reading.markError, whose))}.</p>
      {newer && (
        <>
          <p className="mt-2">
            Known now: {markErrorWords(newer, whose)}. This reading stays as it was made until you
            ask.
          </p>
          {may('reading.renew') && (
            <Button
              className="mt-3"
              busy={again.isPending}
              busyLabel="Reading…"
              onClick={() => again.mutate()}
            >
              Read again with {newer.px.toFixed(1)} px
            </Button>
          )}
        </>
      )}
      {again.isError && (
        <div className="mt-3">
          <ErrorState error={again.error} />
        </div>
      )}
      <ul className="mt-2 flex flex-wrap gap-x-5">
        {reading.reps.map((rep) => (
          <li key={rep.id}>
            <Link
              to={paths.bench(rep.clipId, { again: rep.number })}
              className="inline-block py-2.5"
            >
              Mark rep {rep.number} again, blind
            </Link>
          </li>
        ))}
      </ul>
    </Section>
  );
}

import { Link } from 'react-router-dom';
import type { Reading, SidePage } from '#shared/contracts/readings.ts';
import { useMe } from '#src/api/me.ts';
import { capital } from '#src/ui/figures.ts';
import { markErrorWords } from '#src/ui/mark-error-words.ts';
import { Section } from '#src/ui/page.tsx';
import { paths } from '#src/ui/paths.ts';
import { repName } from '../words/rep-names.ts';
import { ReadAgain } from './read-again.tsx';

/** The marking error that this reading was made with, and another that it could be made with now. */
export function MarkErrorSection({ page, reading }: { page: SidePage; reading: Reading }) {
  const { user } = useMe();
  const { newerMarkError: newer } = page;
  const whose = reading.by.id === user.id ? 'your own' : 'own';
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
          <ReadAgain page={page} />
        </>
      )}
      <ul className="mt-2 flex flex-wrap gap-x-5">
        {reading.reps.map((rep) => (
          <li key={rep.id}>
            <Link
              to={paths.bench(rep.clipId, { again: rep.number })}
              className="inline-block py-2.5"
            >
              Mark {repName(reading, rep.id)} again, blind
            </Link>
          </li>
        ))}
      </ul>
    </Section>
  );
}

import { useQueries } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import type { Clip } from '#shared/contracts/clips.ts';
import type { Visit } from '#shared/contracts/visits.ts';
import { callsOptions } from '#src/api/readings.queries.ts';
import { paths } from '#src/ui/paths.ts';
import { sidesOf } from './sides-of.ts';

type Step = { name: string; to?: string };

/** What is known of a visit's progress through the job. */
export type Progress = {
  consented: boolean;
  mayFilm: boolean;
  clips: readonly Pick<Clip, 'state'>[];
  /** A side of these clips has a call by eye. */
  called: boolean;
};

/** Which step of the job is next, by name. */
export function nextStep({ consented, mayFilm, clips, called }: Progress): string {
  if (clips.some(({ state }) => state === 'ready')) return called ? 'Mark' : 'Call by eye';
  if (clips.length > 0) return 'Upload';
  if (!consented) return 'Consent';
  return mayFilm ? 'Film' : 'Safety';
}

/** The whole job on one line; what comes next stands out. */
export function VisitSteps({
  consented,
  visit,
  clips,
}: {
  consented: boolean;
  visit: Visit;
  clips: readonly Clip[];
}) {
  const sides = sidesOf(clips);
  const calls = useQueries({ queries: sides.map((side) => callsOptions(visit.id, side)) });
  const called = sides.filter((_, n) => (calls[n]?.data?.items.length ?? 0) > 0);
  const [readable] = called;
  const ready = clips.find(({ state }) => state === 'ready');
  const steps: Step[] = [
    { name: 'Consent', to: '#consent' },
    { name: 'Safety', to: '#safety' },
    { name: 'Film', to: '#film' },
    { name: 'Upload', to: '#upload' },
    { name: 'Call by eye', to: '#call' },
    { name: 'Mark', to: ready && paths.bench(ready.id) },
    { name: 'Reading', to: readable && paths.reading(visit.id, readable) },
    { name: 'Replay' },
  ];
  const next = nextStep({
    consented,
    mayFilm: visit.safety?.mayFilm === true,
    clips,
    called: called.length > 0,
  });
  return (
    <ol className="flex flex-wrap text-note leading-6 text-soft" aria-label="Steps of the job">
      {steps.map(({ name, to }, n) => (
        <li
          key={name}
          aria-current={name === next ? 'step' : undefined}
          className={name === next ? 'font-bold text-ink' : undefined}
        >
          {n > 0 && (
            <span aria-hidden="true" className="px-2 font-normal text-soft">
              →
            </span>
          )}
          {to === undefined ? (
            name
          ) : (
            <Link to={to} className="tap no-underline hover:underline">
              {name}
            </Link>
          )}
        </li>
      ))}
    </ol>
  );
}

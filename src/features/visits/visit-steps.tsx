import type { Clip } from '#shared/contracts/clips.ts';
import type { Visit } from '#shared/contracts/visits.ts';

type Step = { name: string; to?: string };
const STEPS: readonly Step[] = [
  { name: 'Consent', to: '#consent' },
  { name: 'Safety', to: '#safety' },
  { name: 'Film', to: '#film' },
  { name: 'Upload', to: '#upload' },
  { name: 'Call by eye', to: '#call' },
  { name: 'Mark' },
  { name: 'Reading' },
  { name: 'Replay' },
];

/** Which step of the job is next, by name. */
export function nextStep(consented: boolean, visit: Visit, clips: readonly Clip[]): string {
  if (!consented) return 'Consent';
  if (visit.safety?.mayFilm !== true) return 'Safety';
  if (clips.length === 0) return 'Film';
  return clips.some(({ state }) => state === 'ready') ? 'Call by eye' : 'Upload';
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
  const next = nextStep(consented, visit, clips);
  return (
    <ol className="flex flex-wrap text-note leading-6 text-soft" aria-label="Steps of the job">
      {STEPS.map(({ name, to }, n) => (
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
            <a href={to} className="tap no-underline hover:underline">
              {name}
            </a>
          )}
        </li>
      ))}
    </ol>
  );
}

import { Link } from 'react-router-dom';
import type { Role } from '#shared/contracts/accounts.ts';
import type { Today } from '#shared/contracts/today.ts';
import { useMe } from '#src/api/me.ts';
import { ButtonLink } from '#src/ui/button-link.tsx';
import { Section } from '#src/ui/page.tsx';
import { paths } from '#src/ui/paths.ts';
import { taskOf } from './task-of.ts';

interface Step {
  readonly name: string;
  readonly says: string;
  readonly done: boolean;
  /** Where it is done; null where something must be done before. */
  readonly to: string | null;
}

const stepsOf = ({ steps, athletes, items }: Today, role: Role): Step[] => {
  const { athleteId } = steps;
  const callTo = items.find(({ kind }) => kind === 'call-missing');
  const all: (Step | null)[] = [
    role === 'owner'
      ? {
          name: 'Say how athletes reach you',
          says: 'Their replay tells them to stop and call if it hurts.',
          done: steps.contact,
          to: paths.practice(),
        }
      : null,
    {
      name: 'Add an athlete',
      says: 'Name, date of birth, body height, and what to be careful with.',
      done: athletes > 0,
      to: paths.newAthlete(),
    },
    {
      name: 'Record their consent',
      says: 'For a minor, from a guardian. Without it nothing can be filmed.',
      done: steps.consent,
      to: athleteId && paths.newConsent(athleteId),
    },
    {
      name: 'Film and send a clip',
      says: 'The visit leads through the safety questions and the filming.',
      done: steps.clip,
      to: athleteId && steps.consent ? paths.newVisit(athleteId) : null,
    },
    {
      name: 'Say what you saw',
      says: 'Your call by eye comes first; then mark, and read the course.',
      done: steps.call,
      to: callTo
        ? taskOf(callTo).action.to
        : athleteId && steps.clip
          ? paths.athlete(athleteId)
          : null,
    },
  ];
  return all.filter((step): step is Step => step !== null);
};

/** Whether a practice is still at its beginning. */
export const isBeginning = (today: Today, role: Role): boolean =>
  stepsOf(today, role).some(({ done }) => !done);

/** From an empty practice to the first call, ticked off as it happens; nothing of it is kept. */
export function FirstSteps({ today }: { today: Today }) {
  const { user } = useMe();
  const steps = stepsOf(today, user.role);
  const next = steps.find(({ done }) => !done);
  const left = steps.filter(({ done }) => !done).length;
  return (
    <Section
      title="To begin"
      note={left === steps.length ? undefined : `${steps.length - left} of ${steps.length} done`}
      wide
    >
      <ol className="max-w-lead">
        {steps.map((step, n) => (
          <li
            key={step.name}
            aria-current={step === next ? 'step' : undefined}
            className="flex gap-4 border-b border-rule py-3 first:pt-0 last:border-0"
          >
            <span className="w-4 flex-none text-soft" aria-hidden="true">
              {step.done ? <Tick /> : n + 1}
            </span>
            <span>
              {step.done || step === next || step.to === null ? (
                <b className={step.done ? 'text-soft' : undefined}>{step.name}</b>
              ) : (
                <Link to={step.to} className="tap font-bold">
                  {step.name}
                </Link>
              )}
              {step.done && <span className="text-reed"> done</span>}
              <span className="block text-soft">{step.says}</span>
            </span>
          </li>
        ))}
      </ol>
      {next && next.to !== null && (
        <ButtonLink look="primary" to={next.to} className="mt-5">
          {next.name}
        </ButtonLink>
      )}
    </Section>
  );
}

function Tick() {
  return (
    <svg width="16" height="16" viewBox="0 0 16 16" className="mt-1 fill-none stroke-reed">
      <path d="M2.5 8.5 6.5 12.5 13.5 4" strokeWidth="2" />
    </svg>
  );
}

import type { Plan } from '#shared/contracts/plans.ts';
import { moment } from '#src/ui/days.ts';
import { doseWords } from '#src/ui/exercise-words.ts';
import { Fold } from '#src/ui/fold.tsx';
import { Section } from '#src/ui/page.tsx';

/** Every time the plan was given or stopped, as the athlete got it. */
export function GivenSection({ plan: { given } }: { plan: Plan }) {
  if (given.length === 0) return null;
  return (
    <Section title="What was given" note="newest first">
      <ol reversed>
        {given.map(({ number, at, by, plan }) => (
          <li key={number} className="border-b border-rule py-2 last:border-0">
            {plan === null ? (
              <p>
                Stopped, {moment(at)}, {by.name}
              </p>
            ) : (
              <Fold title={`Given, ${moment(at)}, ${by.name}`}>
                <ul className="mb-2">
                  {plan.items.map(({ exercise, name, side, dose }) => (
                    <li key={exercise}>
                      {name}, {side} leg: {doseWords(dose)}
                    </li>
                  ))}
                  {plan.items.length === 0 && <li>A retest, no exercise.</li>}
                </ul>
                {plan.note !== '' && <p className="whitespace-pre-line">“{plan.note}”</p>}
              </Fold>
            )}
          </li>
        ))}
      </ol>
    </Section>
  );
}

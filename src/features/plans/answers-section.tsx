import type { Plan, PlanPain } from '#shared/contracts/plans.ts';
import { exerciseOf } from '#shared/plan/library.ts';
import { Button } from '#src/ui/button.tsx';
import { dayOf, shortDay } from '#src/ui/days.ts';
import { Section } from '#src/ui/page.tsx';
import { PAIN_PLACE_WORDS, PAIN_TIME_WORDS, PAIN_WHICH_WORDS } from '#src/ui/pain-words.ts';
import { StateDot } from '#src/ui/state-dot.tsx';
import { useStatus } from '#src/ui/status.tsx';
import { TickTable } from './tick-table.tsx';
import type { PlanActs } from './use-plan-acts.ts';

/** What the athlete answered by the link: what hurts first, then what was done. */
export function AnswersSection({
  plan,
  seePain,
}: {
  plan: Plan;
  seePain: PlanActs['seePain'] | null;
}) {
  const { pain, given, athlete } = plan;
  const say = useStatus();
  if (given.length === 0) return null;
  const unseen = pain.some(({ level, seen }) => level > 0 && seen === null);
  return (
    <>
      <Section
        id="pain"
        title="Pain"
        note="as the athlete said it"
        first
        margin={
          <p>
            What an athlete says is no finding. If in doubt: stop the plan, call them, and leave it
            to whoever is licensed to examine.
          </p>
        }
      >
        {pain.length === 0 && <p className="text-soft">Nothing was said about pain yet.</p>}
        <ul>
          {pain.map((answer) => (
            <li key={answer.id} className="border-b border-rule py-2 first:pt-0 last:border-0">
              <p>
                <b className="tabular-nums">{answer.level} of 10</b>
                {painWords(answer)}
              </p>
              <p className="text-note text-soft">
                {shortDay(answer.day)}
                {answer.seen
                  ? `, looked at by ${answer.seen.by.name}, ${dayOf(answer.seen.at)}`
                  : ''}
                {answer.seen === null && answer.level > 0 && (
                  <>
                    {' '}
                    <StateDot kind="wait">nobody has looked at it</StateDot>
                  </>
                )}
              </p>
            </li>
          ))}
        </ul>
        {unseen && seePain && (
          <Button
            look="primary"
            className="mt-3"
            busy={seePain.isPending}
            onClick={() =>
              seePain.mutate(undefined, { onSuccess: () => say('Marked as looked at.') })
            }
          >
            I have looked at it
          </Button>
        )}
      </Section>
      <Section title="Done" note={`ticked off by ${athlete.name}`}>
        <TickTable plan={plan} />
      </Section>
    </>
  );
}

const painWords = ({ level, places, which, time, exercise }: PlanPain): string => {
  if (level === 0) return ': nothing hurts';
  const where = places.map((place) => PAIN_PLACE_WORDS[place]).join(', ');
  const parts = [
    where,
    ...(which === null ? [] : [PAIN_WHICH_WORDS[which]]),
    ...(time === null ? [] : [PAIN_TIME_WORDS[time]]),
    ...(exercise === null ? [] : [`at ${exerciseOf(exercise).name}`]),
  ];
  return `: ${parts.join(', ')}`;
};

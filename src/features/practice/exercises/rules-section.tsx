import { Link } from 'react-router-dom';
import { READING_LABELS } from '#shared/contracts/readings.ts';
import { exerciseOf } from '#shared/plan/library.ts';
import { type PlanRule, STANDARD_RULES } from '#shared/plan/rules.ts';
import { Section } from '#src/ui/page.tsx';
import { paths } from '#src/ui/paths.ts';
import { SEEN_WORDS } from '#src/ui/words.ts';

const PARTS = {
  pelvis: ', mostly by the pelvis',
  thigh: ', mostly by the thigh',
} as const;

const whenWords = ({ readings, calls, carrier }: PlanRule['when']): string => {
  const part = carrier === null ? '' : PARTS[carrier];
  const read = readings.map((code) => `“${READING_LABELS[code]}”${part}`);
  // which part turns is never seen by eye
  const seen = carrier === null ? calls.map((code) => `“${SEEN_WORDS[code]}” by eye`) : [];
  return [...read, ...seen].join(', or ');
};

/** The rules that suggest exercises, in their order; nothing else does. */
export function RulesSection() {
  return (
    <Section
      title="What leads to what"
      note="The first rule that fits is used."
      first
      margin={
        <>
          <p>The next step begins when the criteria to go on are met.</p>
          <p>
            “{READING_LABELS['cannot-tell']}”, “{READING_LABELS['not-measurable']}” and an unsure
            call lead to a retest, not to exercises.
          </p>
          <p>Rules that name a part need a belt pointer and a thigh pointer.</p>
        </>
      }
    >
      <ol>
        {STANDARD_RULES.map((rule) => (
          <li key={rule.id} className="border-b border-rule py-3 first:pt-0 last:border-0">
            <p className="font-bold">{whenWords(rule.when)}</p>
            <p className="text-soft">{rule.because}</p>
            <ol className="mt-1">
              {rule.stages.map((stage, n) => (
                <li key={n}>
                  Step {n + 1}:{' '}
                  {stage.map((id, k) => (
                    <span key={id}>
                      {k > 0 && ', '}
                      <Link to={paths.exercises(id)} className="tap">
                        {exerciseOf(id).name}
                      </Link>
                    </span>
                  ))}
                </li>
              ))}
            </ol>
          </li>
        ))}
      </ol>
    </Section>
  );
}

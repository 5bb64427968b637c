import type { ReactNode } from 'react';
import type { Finding } from '#shared/contracts/plans.ts';
import { exerciseOf } from '#shared/plan/library.ts';
import { StateDot } from '#src/ui/state-dot.tsx';
import { basisWords, HINDRANCE_WORDS, signedOffWords } from './plan-words.ts';

/** One thing that a plan could start from, and what the rules make of it. */
export function FindingCard({ finding, action }: { finding: Finding; action?: ReactNode }) {
  const { basis, suggestion, hindrance } = finding;
  const signedOff = signedOffWords(finding.signedOff);
  const { title, from } = basisWords(basis);
  const stages =
    suggestion.kind === 'plan'
      ? [...new Set(suggestion.exercises.map(({ stage }) => stage))].map((stage) => ({
          stage,
          names: suggestion.exercises
            .filter((each) => each.stage === stage)
            .map(({ exercise }) => exerciseOf(exercise).name),
        }))
      : [];
  return (
    <li className="border-b border-rule py-5 first:pt-0 last:border-0">
      <h3 className="text-filled font-bold">“{title}”</h3>
      <p className="flex flex-wrap gap-x-4">
        <span className="text-soft">{from}</span>
        <StateDot kind={signedOff.kind}>{signedOff.words}</StateDot>
      </p>
      <p className="mt-2 max-w-lead">{suggestion.because}</p>
      {stages.length > 0 && (
        <ol className="mt-2">
          {stages.map(({ stage, names }) => (
            <li key={stage}>
              <span className="text-soft">Step {stage}:</span> {names.join(', ')}
            </li>
          ))}
        </ol>
      )}
      {hindrance !== null && (
        <p className="mt-2">
          <StateDot kind="wait" wrap>
            {HINDRANCE_WORDS[hindrance]}
          </StateDot>
        </p>
      )}
      {hindrance === null && action !== undefined && <div className="mt-4">{action}</div>}
    </li>
  );
}

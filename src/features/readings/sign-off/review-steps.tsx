import type { ReviewStep } from '#shared/contracts/reviews.ts';
import { moment } from '#src/ui/days.ts';
import { type StateKind, StateDot } from '#src/ui/state-dot.tsx';
import { SEEN_WORDS } from '#src/ui/words.ts';

const STEPS = {
  'handed-in': { kind: 'wait', words: 'Handed in' },
  'signed-off': { kind: 'done', words: 'Signed off' },
  'sent-back': { kind: 'bad', words: 'Sent back' },
} as const satisfies Record<ReviewStep['step'], { kind: StateKind; words: string }>;

const what = ({ label, seen }: ReviewStep): string =>
  label === null ? (seen === null ? '' : `${SEEN_WORDS[seen]}, by eye`) : `“${label}”`;

/** Every step of the review, newest first; none is ever changed. */
export function ReviewSteps({ steps }: { steps: readonly ReviewStep[] }) {
  return (
    <ol aria-label="Steps of the review" className="space-y-3">
      {steps.map((step, n) => (
        <li key={step.id}>
          <StateDot kind={n === 0 ? STEPS[step.step].kind : 'none'} wrap>
            <span className={n === 0 ? 'font-bold text-ink' : 'text-ink'}>
              {STEPS[step.step].words} by {step.by.name}
            </span>
            <span className="block text-soft">
              {what(step)}, {moment(step.at)}
            </span>
            {step.reason !== '' && (
              <span className="block whitespace-pre-wrap break-words text-ink">
                “{step.reason}”
              </span>
            )}
          </StateDot>
        </li>
      ))}
    </ol>
  );
}

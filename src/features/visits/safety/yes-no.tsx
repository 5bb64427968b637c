import { useId } from 'react';
import { useController } from 'react-hook-form';
import type { SafetyQuestion } from '#shared/contracts/visits.ts';
import { useProtocol } from '#src/api/use-protocol.ts';
import { useLabel } from '#src/ui/form/labels.tsx';
import { Segmented } from '#src/ui/segmented.tsx';
import { SAFETY_WORDS } from './safety-words.ts';

const CHOICES = [
  { value: 'no', label: 'No' },
  { value: 'yes', label: 'Yes' },
] as const;

/** One question with its answer beside it; unanswered until somebody answers. */
export function YesNo({ question }: { question: SafetyQuestion }) {
  const id = useId();
  const name = `answers.${question}`;
  const {
    field: { ref, onChange, ...field },
    fieldState,
  } = useController({ name });
  const value: unknown = field.value;
  const { question: words, note } = SAFETY_WORDS[question];
  const protocol = useProtocol();
  useLabel(name, words);
  return (
    <div className="flex items-center justify-between gap-4 border-b border-rule py-2">
      <p id={id}>
        {words}
        {note && <span className="block text-note text-soft">{note(protocol)}</span>}
      </p>
      <div className="flex-none">
        <Segmented
          ref={ref}
          labelledBy={id}
          choices={CHOICES}
          value={value === true ? 'yes' : value === false ? 'no' : null}
          onChange={(answer) => onChange(answer === 'yes')}
          error={fieldState.error?.message}
        />
      </div>
    </div>
  );
}

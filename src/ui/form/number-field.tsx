import { useFormContext, type FieldPath, type FieldValues } from 'react-hook-form';
import { FIELD_BOX, FieldFrame, useFieldIds, type FieldWords } from './field-frame.tsx';
import { useLabel } from './labels.tsx';
import { useFault } from './use-fault.ts';

/** What is typed as a number, with a decimal point or comma; anything else is none. */
const readNumber = (typed: unknown): number =>
  typeof typed === 'number'
    ? typed
    : typeof typed === 'string' && typed.trim() !== ''
      ? Number(typed.trim().replace(',', '.'))
      : NaN;

/** The same where nothing typed means that there is none. */
const readNumberOrNone = (typed: unknown): number | null =>
  typed === null || (typeof typed === 'string' && typed.trim() === '') ? null : readNumber(typed);

/** A number with its unit beside it. */
export function NumberField<F extends FieldValues = FieldValues>({
  name,
  unit,
  emptyIsNull = false,
  ...words
}: FieldWords & { name: FieldPath<F>; unit: string; emptyIsNull?: boolean }) {
  const { register } = useFormContext();
  const error = useFault(name);
  const ids = useFieldIds(words.hint, error);
  useLabel(name, words.label);
  return (
    <FieldFrame ids={ids} error={error} {...words}>
      <span className="mt-1 flex items-center gap-2">
        <input
          {...register(name, { setValueAs: emptyIsNull ? readNumberOrNone : readNumber })}
          id={ids.id}
          inputMode="decimal"
          autoComplete="off"
          aria-describedby={ids.describedBy}
          aria-invalid={error !== undefined}
          className={`${FIELD_BOX} !mt-0 !w-[6em]`}
        />
        <span className="text-soft">{unit}</span>
      </span>
    </FieldFrame>
  );
}

import type { CSSProperties, HTMLInputAutoCompleteAttribute } from 'react';
import { useFormContext, type FieldPath, type FieldValues } from 'react-hook-form';
import { FIELD_BOX, FieldFrame, useFieldIds, type FieldWords } from './field-frame.tsx';
import { useLabel } from './labels.tsx';
import { useFault } from './use-fault.ts';

type Common<F extends FieldValues> = FieldWords & {
  name: FieldPath<F>;
  /** An empty field means null: not known. */
  emptyIsNull?: boolean;
  autoComplete?: HTMLInputAutoCompleteAttribute;
};

/** What every bound control needs: its ids, its fault, and its registration with the form. */
function useBound({ name, label, hint, emptyIsNull = false }: Common<FieldValues>) {
  const { register } = useFormContext();
  const error = useFault(name);
  const ids = useFieldIds(hint, error);
  useLabel(name, label);
  const setValueAs = (value: unknown) => (value === '' ? null : value);
  return {
    ids,
    error,
    control: {
      ...register(name, emptyIsNull ? { setValueAs } : {}),
      id: ids.id,
      'aria-describedby': ids.describedBy,
      'aria-invalid': error !== undefined,
    },
  };
}

/** One line of text. Give the form's values as type argument to have `name` checked. */
export function TextField<F extends FieldValues = FieldValues>({
  type = 'text',
  autoComplete = 'off',
  inputMode,
  max,
  ...field
}: Common<F> & {
  type?: 'text' | 'email' | 'password' | 'date';
  inputMode?: 'text' | 'email' | 'numeric';
  max?: string;
}) {
  const { ids, error, control } = useBound(field);
  return (
    <FieldFrame ids={ids} error={error} {...field}>
      <input
        {...control}
        type={type}
        max={max}
        inputMode={inputMode}
        autoComplete={autoComplete}
        className={`${FIELD_BOX} ${type === 'date' ? 'max-w-[12em]' : ''}`}
      />
    </FieldFrame>
  );
}

/** Several lines of text. */
export function TextArea<F extends FieldValues = FieldValues>({
  rows = 3,
  ...field
}: Common<F> & { rows?: number }) {
  const { ids, error, control } = useBound(field);
  return (
    <FieldFrame ids={ids} error={error} {...field}>
      <textarea
        {...control}
        rows={rows}
        style={{ '--rows': rows } as CSSProperties}
        className={FIELD_BOX}
      />
    </FieldFrame>
  );
}

export type Option<V extends string = string> = { value: V; label: string };

/** One of a few named things, by the browser's own list. */
export function SelectField<F extends FieldValues = FieldValues>({
  options,
  ...field
}: Common<F> & { options: readonly Option[] }) {
  const { ids, error, control } = useBound(field);
  return (
    <FieldFrame ids={ids} error={error} {...field}>
      <select {...control} className={FIELD_BOX}>
        {options.map(({ value, label }) => (
          <option key={value} value={value}>
            {label}
          </option>
        ))}
      </select>
    </FieldFrame>
  );
}

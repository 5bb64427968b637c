import { useController, useFormContext, type FieldPath, type FieldValues } from 'react-hook-form';
import type { ReactNode } from 'react';
import { Checkbox } from '../checkbox.tsx';
import { Segmented, type Choice } from '../segmented.tsx';
import { useLabel } from './labels.tsx';
import { useFault } from './use-fault.ts';

/** A radio group of a form. */
export function SegmentedField<F extends FieldValues = FieldValues>({
  name,
  legend,
  ...rest
}: {
  name: FieldPath<F>;
  legend: ReactNode;
  choices: readonly Choice<string>[];
  cards?: boolean;
}) {
  const {
    field: { ref, onChange, ...field },
    fieldState,
  } = useController({ name });
  const value: unknown = field.value;
  useLabel(name, legend);
  return (
    <Segmented
      {...rest}
      ref={ref}
      legend={legend}
      value={typeof value === 'string' ? value : null}
      onChange={onChange}
      error={fieldState.error?.message}
    />
  );
}

/** A yes-or-no box of a form; with `value`, one of several boxes that fill an array. */
export function CheckboxField<F extends FieldValues = FieldValues>({
  name,
  label,
  note,
  value,
  quiet = false,
}: {
  name: FieldPath<F>;
  label: ReactNode;
  note?: ReactNode;
  value?: string;
  /** Where several boxes share a fault, only one of them says it. */
  quiet?: boolean;
}) {
  const { register } = useFormContext();
  const error = useFault(name);
  // a fault of the whole group belongs to none of its boxes
  useLabel(name, quiet ? null : label);
  return (
    <Checkbox
      {...register(name)}
      value={value}
      label={label}
      note={note}
      error={quiet ? undefined : error}
    />
  );
}

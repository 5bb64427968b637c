import { useState } from 'react';
import { useController, type FieldPath, type FieldValues } from 'react-hook-form';
import { FIELD_BOX, FieldFrame, useFieldIds, type FieldWords } from './field-frame.tsx';
import { useLabel } from './labels.tsx';
import { inUnit, readLength, writeLength, type LengthUnit } from './length.ts';

/** A length, kept in millimetres, typed in `unit`. */
export function LengthField<F extends FieldValues = FieldValues>({
  name,
  unit,
  ...words
}: FieldWords & {
  name: FieldPath<F>;
  unit: LengthUnit;
}) {
  const {
    field: { ref, ...field },
    fieldState,
  } = useController({ name });
  const value: unknown = field.value;
  const mm = typeof value === 'number' ? value : null;
  const [typed, setTyped] = useState<string | null>(null);
  const message = fieldState.error?.message;
  const error =
    message === undefined
      ? undefined
      : mm === null || !Number.isNaN(mm)
        ? inUnit(message, unit)
        : `Write a number of ${unit}, such as ${writeLength(unit === 'mm' ? 135 : 1740, unit)}.`;
  const ids = useFieldIds(words.hint, error);
  useLabel(name, words.label);
  return (
    <FieldFrame ids={ids} error={error} {...words}>
      <span className="mt-1 flex items-center gap-2">
        <input
          ref={ref}
          name={field.name}
          id={ids.id}
          inputMode="decimal"
          autoComplete="off"
          aria-describedby={ids.describedBy}
          aria-invalid={error !== undefined}
          // what is being typed stands as typed; when the field is left, or filled from elsewhere, as it is kept
          value={typed ?? writeLength(mm, unit)}
          onChange={(event) => {
            setTyped(event.target.value);
            field.onChange(readLength(event.target.value, unit));
          }}
          onBlur={() => {
            if (mm === null || !Number.isNaN(mm)) setTyped(null);
            field.onBlur();
          }}
          className={`${FIELD_BOX} !mt-0 !w-[7em]`}
        />
        <span className="text-soft">{unit}</span>
      </span>
    </FieldFrame>
  );
}

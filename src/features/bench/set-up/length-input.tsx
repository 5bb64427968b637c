import { useId, useState } from 'react';
import { FIELD_BOX, Fault } from '#src/ui/form/field-frame.tsx';
import { readLength, writeLength, type LengthUnit } from '#src/ui/form/length.ts';

/** A length of the set-up: sent when the field is left or Enter is pressed, empty for not known. */
export function LengthInput({
  label,
  hint,
  unit,
  value,
  min,
  max,
  disabled,
  onSave,
}: {
  label: string;
  hint?: string;
  unit: LengthUnit;
  /** Millimetres. */
  value: number | null;
  min: number;
  max: number;
  disabled: boolean;
  onSave: (mm: number | null) => void;
}) {
  const id = useId();
  const [typed, setTyped] = useState<string | null>(null);
  const mm = typed === null ? value : readLength(typed, unit);
  const fault =
    mm === null
      ? null
      : Number.isNaN(mm)
        ? `Write a number of ${unit}.`
        : mm < min
          ? `At least ${writeLength(min, unit)} ${unit}.`
          : mm > max
            ? `At most ${writeLength(max, unit)} ${unit}.`
            : null;
  const save = () => {
    if (typed === null || fault !== null) return;
    setTyped(null);
    if (mm !== value) onSave(mm);
  };
  return (
    <div>
      <label htmlFor={id} className="font-bold">
        {label}
      </label>
      {hint && (
        <p id={`${id}-hint`} className="text-note text-soft">
          {hint}
        </p>
      )}
      <span className="mt-1 flex items-center gap-2">
        <input
          id={id}
          inputMode="decimal"
          autoComplete="off"
          disabled={disabled}
          className={`${FIELD_BOX} !mt-0 !w-[7em]`}
          aria-describedby={
            [hint && `${id}-hint`, fault && `${id}-fault`].filter(Boolean).join(' ') || undefined
          }
          aria-invalid={fault !== null}
          value={typed ?? writeLength(value, unit)}
          onChange={(event) => setTyped(event.target.value)}
          onBlur={save}
          onKeyDown={(event) => {
            if (event.key === 'Enter') save();
            else if (event.key === 'Escape') setTyped(null);
          }}
        />
        <span className="text-soft">{unit}</span>
      </span>
      {fault !== null && <Fault id={`${id}-fault`}>{fault}</Fault>}
    </div>
  );
}

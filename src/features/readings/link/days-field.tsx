import { useFormContext } from 'react-hook-form';
import { FIELD_BOX, FieldFrame, useFieldIds } from '#src/ui/form/field-frame.tsx';
import { useFault } from '#src/ui/form/use-fault.ts';

const CHOICES = [7, 14, 30, 90, 180] as const;

/** How long a link opens; a number for the contract, a choice for the person. */
export function DaysField() {
  const { register } = useFormContext();
  const error = useFault('days');
  const ids = useFieldIds(undefined, error);
  return (
    <FieldFrame ids={ids} label="It lapses after" error={error}>
      <select
        {...register('days', { valueAsNumber: true })}
        id={ids.id}
        aria-describedby={ids.describedBy}
        aria-invalid={error !== undefined}
        className={FIELD_BOX}
      >
        {CHOICES.map((days) => (
          <option key={days} value={days}>
            {days} days
          </option>
        ))}
      </select>
    </FieldFrame>
  );
}

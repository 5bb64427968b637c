import { useId, type ComponentProps, type ReactNode } from 'react';
import { cx } from './class-names.ts';
import { Fault } from './form/field-frame.tsx';

/** A box to tick, its whole line being the target. Takes what a native checkbox takes, a form's registration too. */
export function Checkbox({
  label,
  note,
  error,
  className,
  ...input
}: Omit<ComponentProps<'input'>, 'type'> & {
  label: ReactNode;
  note?: ReactNode;
  error?: string;
}) {
  const id = useId();
  return (
    <div className={cx('border-b border-rule', className)}>
      <label className="flex min-h-[44px] items-start gap-3 py-2.5">
        <input
          {...input}
          type="checkbox"
          aria-invalid={error !== undefined || undefined}
          aria-describedby={error === undefined ? undefined : id}
          className="checkbox"
        />
        <span>
          {label}
          {note !== undefined && <span className="block text-note text-soft">{note}</span>}
        </span>
      </label>
      {error !== undefined && (
        <div className="pb-2">
          <Fault id={id}>{error}</Fault>
        </div>
      )}
    </div>
  );
}

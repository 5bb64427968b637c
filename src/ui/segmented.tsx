import { useId, type ReactNode, type Ref } from 'react';
import { cx } from './class-names.ts';
import { Fault } from './form/field-frame.tsx';

export type Choice<V extends string> = {
  value: V;
  label: ReactNode;
  /** A second line, for choices that need one; then they stand as cards. */
  note?: ReactNode;
};

/**
 * One of a few, all of them seen: a radio group. Nothing is chosen while `value` is null. `cards` gives each
 * choice its own box with room for a note.
 */
export function Segmented<V extends string>({
  legend,
  labelledBy,
  choices,
  value,
  onChange,
  error,
  cards = false,
  disabled = false,
  ref,
}: {
  /** Stands above; leave it out where `labelledBy` names words that stand elsewhere. */
  legend?: ReactNode;
  labelledBy?: string;
  choices: readonly Choice<V>[];
  value: V | null;
  onChange: (value: V) => void;
  error?: string;
  cards?: boolean;
  disabled?: boolean;
  /** The first choice, for a form to give the focus to. */
  ref?: Ref<HTMLInputElement>;
}) {
  const id = useId();
  return (
    <div
      role="radiogroup"
      aria-labelledby={labelledBy ?? `${id}-legend`}
      aria-invalid={error !== undefined || undefined}
      aria-describedby={error === undefined ? undefined : `${id}-fault`}
    >
      {legend !== undefined && (
        <p id={`${id}-legend`} className="mb-1 font-bold">
          {legend}
        </p>
      )}
      <div
        className={
          cards
            ? 'grid gap-2 phone:grid-cols-2'
            : cx(
                'inline-flex max-w-full flex-wrap gap-px rounded border bg-edge',
                error === undefined ? 'border-edge' : 'border-alarm ring-1 ring-alarm',
              )
        }
      >
        {choices.map(({ value: own, label, note }, n) => {
          const chosen = own === value;
          return (
            <label
              key={own}
              className={cx(
                'focus-ring-within relative block has-[:focus-visible]:z-10',
                cards
                  ? 'rounded border px-3.5 pb-3 pt-2.5'
                  : 'min-h-[42px] grow whitespace-nowrap px-4 py-[9px] text-center first:rounded-l-[3px] last:rounded-r-[3px]',
                chosen ? 'bg-ink text-mud' : cards ? 'border-edge' : 'bg-mud hover:bg-sheet',
                chosen && (cards ? 'border-ink' : 'font-bold'),
              )}
            >
              <input
                ref={n === 0 ? ref : undefined}
                type="radio"
                name={id}
                value={own}
                checked={chosen}
                disabled={disabled}
                onChange={() => onChange(own)}
                className="absolute inset-0 m-0 h-full w-full cursor-pointer opacity-0 disabled:cursor-not-allowed"
              />
              <span className={cards ? 'block text-lead font-bold leading-7' : undefined}>
                {label}
              </span>
              {note !== undefined && (
                <span className={cx('block text-note', chosen ? 'text-mud' : 'text-soft')}>
                  {note}
                </span>
              )}
            </label>
          );
        })}
      </div>
      {error !== undefined && <Fault id={`${id}-fault`}>{error}</Fault>}
    </div>
  );
}

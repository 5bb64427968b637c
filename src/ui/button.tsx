import type { ComponentProps } from 'react';
import { cx } from './class-names.ts';

/**
 * `primary` is the page's one filled action; `danger` deletes or withdraws; `plain` looks like a link and
 * acts like a button.
 */
export type ButtonLook = 'primary' | 'secondary' | 'danger' | 'plain';

const BASE =
  'inline-flex min-h-[44px] items-center justify-center gap-2 rounded text-body disabled:cursor-not-allowed aria-disabled:cursor-not-allowed';
const BOX = 'border px-5 py-2 font-bold no-underline';
const LOOKS: Record<ButtonLook, string> = {
  primary: `${BOX} border-ink bg-ink text-mud hover:border-[#000] hover:bg-[#000] disabled:border-edge disabled:bg-transparent disabled:text-soft`,
  secondary: `${BOX} border-edge text-ink hover:border-ink hover:bg-sheet disabled:border-rule disabled:bg-transparent disabled:text-soft`,
  danger: `${BOX} border-alarm text-alarm hover:bg-alarm-pale disabled:border-rule disabled:text-soft`,
  plain:
    'py-2 text-ink underline decoration-1 underline-offset-[3px] hover:decoration-2 disabled:text-soft disabled:no-underline',
};

export const buttonClass = (look: ButtonLook = 'secondary', className?: string): string =>
  cx(BASE, LOOKS[look], className);

type ButtonProps = ComponentProps<'button'> & {
  look?: ButtonLook;
  /** While its work runs: says so, keeps its width and the focus, and does not fire again. */
  busy?: boolean;
  busyLabel?: string;
};

export function Button({
  look,
  busy = false,
  busyLabel,
  className,
  children,
  onClick,
  type = 'button',
  ...rest
}: ButtonProps) {
  return (
    <button
      {...rest}
      type={type}
      className={buttonClass(look, className)}
      aria-disabled={busy || undefined}
      onClick={(event) => {
        if (busy) event.preventDefault();
        else onClick?.(event);
      }}
    >
      {busy && busyLabel !== undefined ? busyLabel : children}
    </button>
  );
}

import type { ComponentProps } from 'react';
import { cx } from '#src/ui/class-names.ts';

/** A button on the dusk around the clip. `primary` is the one thing to do next. */
export function DuskButton({
  primary = false,
  className,
  ...rest
}: ComponentProps<'button'> & { primary?: boolean }) {
  return (
    <button
      type="button"
      {...rest}
      className={cx(
        'min-h-[44px] rounded border px-3 py-1.5 text-note font-bold disabled:text-dusk-edge',
        primary
          ? 'border-dusk-ink bg-dusk-ink text-dusk'
          : 'border-dusk-edge bg-dusk-2 text-dusk-ink hover:border-dusk-soft disabled:border-dusk-rule',
        className,
      )}
    />
  );
}

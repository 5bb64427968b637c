import { useEffect, useId, useRef, useState, type ReactNode } from 'react';
import { cx } from './class-names.ts';

/** A button that opens a small panel below it. Escape, a click elsewhere and leaving by Tab close it. */
export function Disclosure({
  label,
  button,
  className,
  panelClassName,
  children,
}: {
  /** For the ear, where the button shows initials or a shape. */
  label?: string;
  button: ReactNode;
  className?: string;
  panelClassName?: string;
  children: ReactNode;
}) {
  const [open, setOpen] = useState(false);
  const wrapper = useRef<HTMLDivElement>(null);
  const trigger = useRef<HTMLButtonElement>(null);
  const id = useId();
  useEffect(() => {
    if (!open) return;
    const outside = (event: Event) => {
      if (event.target instanceof Node && !wrapper.current?.contains(event.target)) setOpen(false);
    };
    const escape = (event: KeyboardEvent) => {
      if (event.key !== 'Escape') return;
      setOpen(false);
      trigger.current?.focus();
    };
    document.addEventListener('pointerdown', outside);
    document.addEventListener('focusin', outside);
    document.addEventListener('keydown', escape);
    return () => {
      document.removeEventListener('pointerdown', outside);
      document.removeEventListener('focusin', outside);
      document.removeEventListener('keydown', escape);
    };
  }, [open]);
  return (
    <div ref={wrapper} className={cx('relative', className)}>
      <button
        ref={trigger}
        type="button"
        aria-label={label}
        aria-expanded={open}
        aria-controls={open ? id : undefined}
        onClick={() => setOpen(!open)}
        className="grid min-h-[44px] min-w-[44px] place-items-center"
      >
        {button}
      </button>
      {open && (
        <div
          id={id}
          className={cx(
            'absolute right-0 top-full z-30 rounded border border-ink bg-mud',
            panelClassName,
          )}
        >
          {children}
        </div>
      )}
    </div>
  );
}

import type { ReactNode } from 'react';
import { cx } from './class-names.ts';

/** done = filled dot, wait = half dot, bad = turned square, none = open dot. The words say the same. */
export type StateKind = 'done' | 'wait' | 'bad' | 'none';

const COLOURS: Record<StateKind, string> = {
  done: 'text-reed',
  wait: 'text-ochre',
  bad: 'text-alarm',
  none: 'text-soft',
};

export function StateDot({
  kind,
  children,
  wrap = false,
}: {
  kind: StateKind;
  children: ReactNode;
  /** Long sentences may break; short states stay on one line. */
  wrap?: boolean;
}) {
  return (
    <span
      className={cx(
        'inline-flex items-start gap-2 align-top',
        COLOURS[kind],
        !wrap && 'whitespace-nowrap',
      )}
    >
      <svg width="12" height="24" viewBox="-6 -12 12 24" aria-hidden="true" className="flex-none">
        {kind === 'bad' ? (
          <rect
            x="-4"
            y="-4"
            width="8"
            height="8"
            transform="rotate(45)"
            fill="none"
            stroke="currentColor"
            strokeWidth="2"
          />
        ) : (
          <circle
            r="4.5"
            fill={kind === 'done' ? 'currentColor' : 'none'}
            stroke="currentColor"
            strokeWidth="2"
          />
        )}
        {kind === 'wait' && <path d="M0-4.5A4.5 4.5 0 0 0 0 4.5z" fill="currentColor" />}
      </svg>
      <span>{children}</span>
    </span>
  );
}

import type { ReactNode } from 'react';

/** A part that can be folded away, by the browser's own element; the triangle shows which way it is. */
export function Fold({
  title,
  open = false,
  children,
}: {
  title: string;
  open?: boolean;
  children: ReactNode;
}) {
  return (
    <details open={open} className="group">
      <summary className="inline-flex min-h-[44px] list-none items-center gap-2 font-bold [&::-webkit-details-marker]:hidden">
        <svg
          width="10"
          height="10"
          viewBox="0 0 10 10"
          aria-hidden="true"
          className="fill-current transition-transform group-open:rotate-90"
        >
          <path d="M2 0l6 5-6 5z" />
        </svg>
        <span className="underline decoration-1 underline-offset-[3px]">{title}</span>
      </summary>
      {children}
    </details>
  );
}

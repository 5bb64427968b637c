import type { ReactNode } from 'react';

/** Read by a screen reader, not seen. */
export function VisuallyHidden({ children }: { children: ReactNode }) {
  return <span className="sr-only">{children}</span>;
}

import { type RefObject, useEffect, useRef } from 'react';

/**
 * A heading at which the keyboard goes on once `step` is another: where the control that had the focus went with
 * the step before. Give the heading a `tabIndex` of −1.
 */
export function useGoesOnHere<E extends HTMLElement>(step: unknown): RefObject<E | null> {
  const here = useRef<E>(null);
  const before = useRef(step);
  useEffect(() => {
    // a page that has just been opened is no step
    if (before.current === step) return;
    before.current = step;
    if (document.activeElement === document.body) here.current?.focus();
  }, [step]);
  return here;
}

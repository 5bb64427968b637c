import { useLayoutEffect, useState, type RefObject } from 'react';
import type { Size } from './viewport.ts';

/** Size of an element, CSS px, followed as it changes; null until it was measured. */
export function useSize(ref: RefObject<HTMLElement | null>): Size | null {
  const [size, setSize] = useState<Size | null>(null);
  useLayoutEffect(() => {
    const element = ref.current;
    if (!element) return;
    const observer = new ResizeObserver(([entry]) => {
      if (!entry) return;
      const { width, height } = entry.contentRect;
      setSize(width > 0 && height > 0 ? { width, height } : null);
    });
    observer.observe(element);
    return () => observer.disconnect();
  }, [ref]);
  return size;
}

import { useEffect, useRef } from 'react';

/** The newest of a value for what runs later: a timer, an answer that was waited for. */
export function useNewest<T>(value: T): { readonly current: T } {
  const newest = useRef(value);
  useEffect(() => {
    newest.current = value;
  });
  return newest;
}

import { useEffect } from 'react';
import { useLocation } from 'react-router-dom';

/** Goes to the part that the address names (`#clip-…`), once the page that holds it is there. */
export function useHashTarget(): void {
  const { hash, key } = useLocation();
  useEffect(() => {
    if (hash === '') return;
    const target = document.getElementById(hash.slice(1));
    target?.scrollIntoView();
    target?.focus({ preventScroll: true });
  }, [hash, key]);
}

import { useEffect } from 'react';
import { useLocation } from 'react-router-dom';

/** Goes to the part that the address names (`#clip-…`), once the page that holds it is there. */
export function useHashTarget(): void {
  const { hash, key } = useLocation();
  useEffect(() => {
    if (hash === '') return;
    const target = document.getElementById(hash.slice(1));
    // what is folded away opens
    for (let fold = target?.closest('details'); fold; fold = fold.parentElement?.closest('details'))
      fold.open = true;
    target?.scrollIntoView();
    target?.focus({ preventScroll: true });
  }, [hash, key]);
}

import { useEffect, useRef } from 'react';
import { useLocation } from 'react-router-dom';

/** After going to another page the focus stands at its heading, so that a screen reader starts there. */
export function Arrival() {
  const { pathname, hash } = useLocation();
  const before = useRef(pathname);
  useEffect(() => {
    if (before.current === pathname) return;
    before.current = pathname;
    // the page itself goes to the part that the address names
    if (hash !== '') return;
    // a page may have given the focus to a field of its own
    if (document.activeElement instanceof HTMLInputElement) return;
    const start =
      document.querySelector<HTMLElement>('h1[tabindex]') ?? document.querySelector('main');
    start?.focus({ preventScroll: true });
  }, [pathname, hash]);
  return null;
}

import { useEffect, useRef } from 'react';
import { useLocation } from 'react-router-dom';

/** Gives the focus to the page's heading, or to the page where it has none yet. */
function focusStart() {
  // a page may have given the focus to a field of its own
  if (document.activeElement instanceof HTMLInputElement) return;
  const start =
    document.querySelector<HTMLElement>('h1[tabindex]') ?? document.querySelector('main');
  start?.focus({ preventScroll: true });
}

/**
 * After going to another page the focus stands at its heading, so that a screen reader starts there. A page
 * that shows a heading while it loads and another one after it would lose it: until the person does
 * something, it is put back.
 */
export function Arrival() {
  const { pathname, hash } = useLocation();
  const before = useRef(pathname);
  useEffect(() => {
    if (before.current === pathname) return;
    before.current = pathname;
    // the page itself goes to the part that the address names
    if (hash !== '') return;
    focusStart();
    const observer = new MutationObserver(() => {
      if (document.activeElement === document.body) focusStart();
    });
    observer.observe(document.body, { childList: true, subtree: true });
    const until = new AbortController();
    const stop = () => {
      observer.disconnect();
      until.abort();
    };
    const options = { capture: true, signal: until.signal };
    window.addEventListener('keydown', stop, options);
    window.addEventListener('pointerdown', stop, options);
    return stop;
  }, [pathname, hash]);
  return null;
}

import { useEffect, useState } from 'react';
import { filmState } from './replay-api.ts';

/** How often an open page asks whether its link still lives, ms. */
export const ASK_EVERY = 15_000;
/** The longest wait that a browser's timer holds, ms. */
const LONGEST_WAIT = 2 ** 31 - 1;

/**
 * True once the link has ended while its page was open: asked now and then while the page is seen, at once when
 * it is seen again, at the moment of its end, and whenever `check` is called. No connection says nothing.
 */
export function useStillLive(
  token: string,
  expiresAt: string,
): { readonly ended: boolean; readonly check: () => void } {
  const [ended, setEnded] = useState(false);
  const [asked, setAsked] = useState(0);
  useEffect(() => {
    if (ended) return;
    const stop = new AbortController();
    const ask = () => {
      if (document.visibilityState === 'hidden') return;
      filmState(token, stop.signal).then(
        (state) => {
          if (state === 'gone') setEnded(true);
        },
        (error: unknown) => {
          // left while it was on its way
          if (!stop.signal.aborted) throw error;
        },
      );
    };
    if (asked > 0) ask();
    const every = setInterval(ask, ASK_EVERY);
    const left = Date.parse(expiresAt) - Date.now();
    const atEnd =
      left > 0 && left < LONGEST_WAIT ? setTimeout(ask, Math.ceil(left) + 500) : undefined;
    document.addEventListener('visibilitychange', ask);
    return () => {
      stop.abort();
      clearInterval(every);
      clearTimeout(atEnd);
      document.removeEventListener('visibilitychange', ask);
    };
  }, [token, expiresAt, ended, asked]);
  return { ended, check: () => setAsked((n) => n + 1) };
}

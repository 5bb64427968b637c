import { useEffect } from 'react';
import { filmIsThere } from './replay-api.ts';

/** How often an open page asks whether its film is ready, ms. */
export const ASK_FILM_EVERY = 5_000;

/** In place of the film while the copy with the hidden head is made. */
export function BeingPrepared({ token, onReady }: { token: string; onReady: () => void }) {
  useEffect(() => {
    const stop = new AbortController();
    const ask = () => {
      filmIsThere(token, stop.signal).then(
        (there) => {
          if (there) onReady();
        },
        (error: unknown) => {
          // left while it was on its way
          if (!stop.signal.aborted) throw error;
        },
      );
    };
    const every = setInterval(ask, ASK_FILM_EVERY);
    return () => {
      stop.abort();
      clearInterval(every);
    };
  }, [token, onReady]);
  return (
    <section aria-label="The film" role="status" className="bg-dusk px-4 py-12 text-dusk-ink">
      <p className="font-bold">The film is being prepared.</p>
      <p className="mt-1 text-dusk-soft">
        The head is being hidden on it. It appears here by itself once it is ready.
      </p>
    </section>
  );
}

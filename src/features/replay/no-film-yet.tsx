import { useEffect, useState } from 'react';
import type { PublicReplay } from '#shared/contracts/replays.ts';
import { filmState } from './replay-api.ts';

/** How often an open page asks whether its film is ready, ms. */
export const ASK_FILM_EVERY = 5_000;

/** In place of the film while the copy with the hidden head is made, and where that failed. */
export function NoFilmYet({
  token,
  head,
  coach,
  onReady,
}: {
  token: string;
  /** As it stood when the page was opened. */
  head: PublicReplay['head'];
  coach: string;
  onReady: () => void;
}) {
  const [now, setNow] = useState(head);
  useEffect(() => {
    const stop = new AbortController();
    const ask = () => {
      filmState(token, stop.signal).then(
        (state) => {
          if (state === 'hidden' || state === 'shown') onReady();
          // that it ended is told by the page
          else if (state !== null && state !== 'gone') setNow(state);
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
      {now === 'failed' ? (
        <>
          <p className="font-bold">The film is not here yet.</p>
          <p className="mt-1 text-dusk-soft">
            Hiding the head on it did not work, so it is not shown. {coach} can see that and make it
            again; it then appears here by itself.
          </p>
        </>
      ) : (
        <>
          <p className="font-bold">The film is being prepared.</p>
          <p className="mt-1 text-dusk-soft">
            The head is being hidden on it. It appears here by itself once it is ready.
          </p>
        </>
      )}
    </section>
  );
}

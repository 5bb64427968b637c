import { useCallback, useEffect, useState } from 'react';
import { Notice } from './notice.tsx';
import { PassPhrase } from './pass-phrase.tsx';
import { openReplay, type Opening } from './replay-api.ts';
import { ReplayPage } from './replay-page.tsx';

/** The athlete's page: one link, one replay, no account. */
export function ReplayApp({ token }: { token: string | null }) {
  const [opening, setOpening] = useState<Opening | null>(token === null ? { is: 'gone' } : null);
  const [attempt, setAttempt] = useState(0);
  useEffect(() => {
    if (token === null) return;
    const stop = new AbortController();
    openReplay(token, stop.signal).then(setOpening, (error: unknown) => {
      // left while it was on its way
      if (!stop.signal.aborted) throw error;
    });
    return () => stop.abort();
  }, [token, attempt]);

  const again = useCallback(() => {
    setOpening(null);
    setAttempt((n) => n + 1);
  }, []);
  if (opening === null || token === null)
    return opening === null ? <OpeningNow /> : <Notice opening={{ is: 'gone' }} onAgain={again} />;
  if (opening.is === 'open')
    return (
      <ReplayPage
        token={token}
        replay={opening.replay}
        onEnded={() => setOpening({ is: 'ended' })}
        onReady={again}
      />
    );
  if (opening.is === 'phrase')
    return <PassPhrase token={token} onUnlocked={again} onFailed={(is) => setOpening({ is })} />;
  return <Notice opening={opening} onAgain={again} />;
}

function OpeningNow() {
  return (
    <main className="min-h-dvh bg-dusk p-4 text-dusk-soft" role="status" aria-busy="true">
      Opening your replay…
    </main>
  );
}

import { useRef, useState } from 'react';
import type { Replay } from '#shared/contracts/replays.ts';
import { Button } from './button.tsx';
import { ErrorState } from './states.tsx';
import { StateDot, type StateKind } from './state-dot.tsx';

const HEADS: Record<Exclude<Replay['head'], 'shown'>, readonly [kind: StateKind, words: string]> = {
  hidden: ['done', 'The head is hidden.'],
  'being-prepared': [
    'wait',
    'The film with the hidden head is being prepared; until then the link shows none.',
  ],
  'to-be-looked-at': [
    'wait',
    'The box around the head was changed. The link shows no film until somebody has looked at it on the Bench.',
  ],
  failed: [
    'bad',
    'The film with the hidden head could not be made, so the link shows none. Try again; if it fails once more, look through the box on the Bench, or end this link and make one that shows the head.',
  ],
};

/** How a link's promise to hide the head stands, and the way on where it could not be kept. */
export function LinkHead({
  head,
  onAgain,
}: {
  head: Exclude<Replay['head'], 'shown'>;
  /** Left out where this person may not ask for it. */
  onAgain?: () => Promise<void>;
}) {
  const [busy, setBusy] = useState(false);
  const [error, setError] = useState<unknown>(null);
  const words = useRef<HTMLParagraphElement>(null);
  const again = async (ask: () => Promise<void>) => {
    setBusy(true);
    setError(null);
    try {
      await ask();
      // the button goes, the keyboard stays in this row
      words.current?.focus();
    } catch (problem) {
      setError(problem);
    } finally {
      setBusy(false);
    }
  };
  const [kind, sentence] = HEADS[head];
  return (
    <>
      <p ref={words} tabIndex={-1} className="max-w-lead text-note">
        <StateDot kind={kind} wrap>
          {sentence}
        </StateDot>
      </p>
      {error !== null && <ErrorState error={error} />}
      {head === 'failed' && onAgain && (
        <Button className="my-1.5" busy={busy} onClick={() => void again(onAgain)}>
          Try again
        </Button>
      )}
    </>
  );
}

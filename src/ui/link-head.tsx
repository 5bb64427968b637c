import { useRef, useState } from 'react';
import type { Replay } from '#shared/contracts/replays.ts';
import { Button } from './button.tsx';
import { shortDay } from './days.ts';
import { ErrorState } from './states.tsx';
import { StateDot, type StateKind } from './state-dot.tsx';

const HEADS: Record<Replay['head'], readonly [kind: StateKind, words: string]> = {
  shown: ['done', 'The head is shown.'],
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

const EARLIER: Record<Replay['head'], readonly [kind: StateKind, words: string]> = {
  shown: ['done', 'it is shown.'],
  hidden: ['done', 'it is shown, the head hidden.'],
  'being-prepared': ['wait', 'its film with the hidden head is being prepared.'],
  'to-be-looked-at': [
    'wait',
    'the box around its head was changed; it is not shown until somebody has looked at that on the Bench.',
  ],
  failed: ['bad', 'its film with the hidden head could not be made, so it is not shown.'],
};

/** How a link's promise to hide the head stands, and the way on where it could not be kept. */
export function LinkHead({
  head,
  besideOf,
  onAgain,
}: {
  head: Replay['head'];
  /** The day of the earlier lift that is meant; left out: the link's own film. */
  besideOf?: string;
  /** Left out where this person may not ask for it. */
  onAgain?: () => Promise<void>;
}) {
  const [busy, setBusy] = useState(false);
  const [error, setError] = useState<unknown>(null);
  const line = useRef<HTMLParagraphElement>(null);
  const again = async (ask: () => Promise<void>) => {
    setBusy(true);
    setError(null);
    try {
      await ask();
      // the button goes, the keyboard stays in this row
      line.current?.focus();
    } catch (problem) {
      setError(problem);
    } finally {
      setBusy(false);
    }
  };
  const [kind, words] = (besideOf === undefined ? HEADS : EARLIER)[head];
  const sentence = besideOf === undefined ? words : `Beside it ${shortDay(besideOf)}: ${words}`;
  return (
    <>
      <p ref={line} tabIndex={-1} className="max-w-lead text-note">
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

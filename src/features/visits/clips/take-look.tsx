import { useEffect, useRef } from 'react';
import { Link } from 'react-router-dom';
import { Button } from '#src/ui/button.tsx';
import { StateDot, type StateKind } from '#src/ui/state-dot.tsx';
import { Skeleton } from '#src/ui/states.tsx';
import type { TakeLooked } from './use-take-look.ts';
import { GUIDE_STEPS, takeVerdict, type TakeVerdict } from '../uploads/take-words.ts';

const KIND: Record<TakeVerdict['grade'], StateKind> = {
  good: 'done',
  weak: 'done',
  again: 'bad',
  open: 'wait',
};

/** Whether the take will do, said while the athlete still stands there. */
export function TakeLookState(props: {
  name: string;
  looked: TakeLooked;
  asksPointers: boolean;
  /** A person pressed for it just now. */
  asked?: boolean;
}) {
  const here = useRef<HTMLDivElement>(null);
  const { look, rest } = props.looked;
  const asked = props.asked || rest !== 'open';
  // the button that asked is gone: the keyboard goes on at the answer
  useEffect(() => {
    if (asked && document.activeElement === document.body) here.current?.focus();
  }, [asked, look]);
  // one element from looking to told, so that a screen reader hears the change
  return (
    <div ref={here} tabIndex={-1} className="mt-1 text-note" role="status">
      <Content {...props} />
    </div>
  );
}

function Content({
  name,
  looked: { look, failed, rest, lookAtRest },
  asksPointers,
}: Parameters<typeof TakeLookState>[0]) {
  if (failed)
    return (
      <p className="text-soft">
        Whether the take will do could not be told here: its pictures cannot be read. Look at it
        before the athlete leaves.
      </p>
    );
  if (!look)
    return (
      <>
        <p className="text-soft">
          Looking at the pictures<span className="sr-only"> of {name}</span>: some seconds …
        </p>
        <Skeleton className="h-5 w-56 max-w-full" />
      </>
    );
  const { grade, summary, lines, inPart } = takeVerdict(look, asksPointers);
  return (
    <>
      <StateDot kind={KIND[grade]} wrap>
        {summary}
      </StateDot>
      {lines.length > 0 && (
        <ul className="space-y-1 pl-5">
          {lines.map(({ words, step, grade: of }) => (
            <li key={words} className={of === 'again' ? undefined : 'text-soft'}>
              {words}{' '}
              <Link to={`#guide-${step}`} aria-label={`How: ${GUIDE_STEPS[step]}`}>
                How
              </Link>
            </li>
          ))}
        </ul>
      )}
      {inPart !== null && (
        <p className="pl-5 text-soft">
          {inPart}{' '}
          {rest === 'failed' ? (
            'The rest cannot be read: look at it yourself.'
          ) : (
            <Button
              look="plain"
              className="text-note"
              busy={rest === 'looking'}
              busyLabel="Looking at the rest …"
              onClick={lookAtRest}
            >
              Look at the rest <span className="sr-only">of {name}</span>
            </Button>
          )}
        </p>
      )}
    </>
  );
}

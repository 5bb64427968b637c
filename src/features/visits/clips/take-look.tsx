import type { UseQueryResult } from '@tanstack/react-query';
import { useEffect, useRef } from 'react';
import { Link } from 'react-router-dom';
import type { TakeLook } from '#src/tracking/take/look-at-take.ts';
import { StateDot, type StateKind } from '#src/ui/state-dot.tsx';
import { Skeleton } from '#src/ui/states.tsx';
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
  query: Pick<UseQueryResult<TakeLook>, 'data' | 'isError'>;
  asksPointers: boolean;
  /** A person pressed for it just now. */
  asked?: boolean;
}) {
  const here = useRef<HTMLDivElement>(null);
  // the button that asked is gone: the keyboard goes on at the answer
  useEffect(() => {
    if (props.asked && document.activeElement === document.body) here.current?.focus();
  }, [props.asked]);
  // one element from looking to told, so that a screen reader hears the change
  return (
    <div ref={here} tabIndex={-1} className="mt-1 text-note" role="status">
      <Content {...props} />
    </div>
  );
}

function Content({
  name,
  query: { data, isError },
  asksPointers,
}: Parameters<typeof TakeLookState>[0]) {
  if (isError)
    return (
      <p className="text-soft">
        Whether the take will do could not be told here: its pictures cannot be read. Look at it
        before the athlete leaves.
      </p>
    );
  if (!data)
    return (
      <>
        <p className="text-soft">
          Looking at the pictures<span className="sr-only"> of {name}</span>: some seconds …
        </p>
        <Skeleton className="h-5 w-56 max-w-full" />
      </>
    );
  const { grade, summary, lines } = takeVerdict(data, asksPointers);
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
    </>
  );
}

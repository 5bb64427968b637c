import { type ReactNode, useContext } from 'react';
import { BlindContext } from '../blind/blind-context.ts';
import { useBench, useBenchDocument, useBenchTools } from '../bench-context.ts';
import { keyWords } from './key-map.ts';

function Key({ children }: { children: ReactNode }) {
  return (
    <kbd className="rounded-[3px] border border-edge bg-sheet px-1.5 font-sans text-caption font-bold text-ink">
      {children}
    </kbd>
  );
}

/** The fixed keys in one line under the strip, where no window is too low for them; the rest stands in the list. */
export function KeyHints() {
  const { store } = useBenchTools();
  const { may } = useBenchDocument();
  const { hide, 'next-frame-to-mark': next } = useBench((state) => state.taste.keys);
  const blind = useContext(BlindContext) !== null;
  return (
    <div className="bench-keys text-caption text-soft">
      <p>
        <Key>←</Key> <Key>→</Key> one frame
      </p>
      <p>
        <Key>Page Up</Key> <Key>Page Down</Key> ten
      </p>
      <p>
        <Key>Home</Key> <Key>End</Key> {blind ? 'the clip’s ends' : 'the rep’s bounds'}
      </p>
      {blind && (
        <p>
          {keyWords(next).map((part) => (
            <Key key={part}>{part}</Key>
          ))}{' '}
          next frame to mark
        </p>
      )}
      {may.mark && (
        <>
          <p>
            <Key>Tab</Key> to a mark, arrows nudge it
          </p>
          <p>
            <Key>Enter</Key> places the named landmark
          </p>
          <p>
            {keyWords(hide).map((part) => (
              <Key key={part}>{part}</Key>
            ))}{' '}
            can’t see it
          </p>
        </>
      )}
      <p>
        <button
          type="button"
          onClick={() => store.setState({ keysOpen: true })}
          className="min-h-[24px] text-ink underline underline-offset-[3px]"
        >
          all keys
        </button>
      </p>
    </div>
  );
}

import type { ReactNode } from 'react';
import { useBench, useBenchTools } from '../bench-context.ts';
import { keyWords } from '../keys/key-map.ts';

export function Key({ children }: { children: ReactNode }) {
  return (
    <kbd className="rounded-[3px] border border-dusk-edge bg-dusk-2 px-1.5 font-sans text-caption font-bold text-dusk-ink">
      {children}
    </kbd>
  );
}

/** The fixed keys, at the foot of the lead column; the rest stands in the list of keys. */
export function KeyHints() {
  const { store } = useBenchTools();
  const hide = useBench((state) => state.taste.keys.hide);
  return (
    <div className="bench-keys text-caption text-dusk-soft">
      <p>
        <Key>←</Key> <Key>→</Key> one frame
      </p>
      <p>
        <Key>Page Up</Key> <Key>Page Down</Key> ten frames
      </p>
      <p>
        <Key>Home</Key> <Key>End</Key> the rep’s bounds
      </p>
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
        can’t see it ·{' '}
        <button
          type="button"
          onClick={() => store.setState({ keysOpen: true })}
          className="min-h-[24px] underline underline-offset-[3px]"
        >
          all keys
        </button>
      </p>
    </div>
  );
}

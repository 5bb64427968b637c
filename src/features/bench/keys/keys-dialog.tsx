import { useState, type KeyboardEvent } from 'react';
import { Button } from '#src/ui/button.tsx';
import { Dialog } from '#src/ui/dialog.tsx';
import { useBench, useBenchTools } from '../bench-context.ts';
import {
  type Act,
  ACT_WORDS,
  ACTS,
  chordOf,
  DEFAULT_KEYS,
  isFixed,
  keyWords,
  withKey,
} from './key-map.ts';

const FIXED: readonly { keys: readonly string[]; does: string }[] = [
  { keys: ['←', '→'], does: 'One frame, while the clip has the focus' },
  { keys: ['Page Up', 'Page Down'], does: 'Ten frames' },
  { keys: ['Home', 'End'], does: 'First and last frame of the rep' },
  { keys: ['Enter'], does: 'Place the named landmark at the pointer, or at its previous position' },
  { keys: ['Tab'], does: 'From the clip to the marks of this frame' },
  { keys: ['← ↑ → ↓'], does: 'On a mark: nudge by 1 px; 10 with Shift, a tenth with Alt' },
  { keys: ['Delete'], does: 'On a mark: take it away' },
  { keys: ['Escape'], does: 'Put back what is being moved' },
];

const KEY =
  'inline-block rounded-[3px] border border-edge bg-sheet px-2 font-sans text-caption font-bold text-ink';

/** Every key of the Bench. The lower ones can be changed: press the button, then the new key. */
export function KeysDialog() {
  const { store } = useBenchTools();
  const open = useBench((state) => state.keysOpen);
  const keys = useBench((state) => state.taste.keys);
  const [changing, setChanging] = useState<Act | null>(null);
  const [fault, setFault] = useState<string | null>(null);
  const close = () => {
    store.setState({ keysOpen: false });
    setChanging(null);
    setFault(null);
  };
  const setKeys = (next: typeof keys) =>
    store.setState((state) => ({ taste: { ...state.taste, keys: next } }));
  const onKeyDown = (act: Act) => (event: KeyboardEvent) => {
    if (changing !== act || event.key === 'Tab') return;
    const chord = chordOf(event);
    event.preventDefault();
    event.stopPropagation();
    if (event.key === 'Escape') setChanging(null);
    else if (chord === null) return;
    else if (isFixed(chord)) setFault(`${keyWords(chord).join(' ')} already means something here.`);
    else {
      setKeys(withKey(keys, act, chord));
      setChanging(null);
      setFault(null);
    }
  };
  return (
    <Dialog open={open} title="Keys" onClose={close}>
      <dl className="text-note">
        {FIXED.map(({ keys: written, does }) => (
          <div key={does} className="grid grid-cols-[9.5em_1fr] gap-3 border-b border-rule py-1.5">
            <dt>
              {written.map((key) => (
                <kbd key={key} className={`${KEY} mr-1`}>
                  {key}
                </kbd>
              ))}
            </dt>
            <dd>{does}</dd>
          </div>
        ))}
      </dl>
      <h3 className="mt-5 font-bold">Yours to change</h3>
      <ul className="text-note">
        {ACTS.map((act) => (
          <li key={act} className="flex items-center justify-between gap-3 border-b border-rule">
            <span>{ACT_WORDS[act]}</span>
            <button
              type="button"
              className="min-h-[44px] whitespace-nowrap text-right"
              aria-label={`${ACT_WORDS[act]}: ${keyWords(keys[act]).join(' ')}. Change.`}
              onClick={() => {
                setFault(null);
                setChanging(changing === act ? null : act);
              }}
              onKeyDown={onKeyDown(act)}
              onBlur={() => setChanging(null)}
            >
              {changing === act ? (
                <span className="text-ochre">press the new key</span>
              ) : (
                keyWords(keys[act]).map((part) => (
                  <kbd key={part} className={`${KEY} ml-1`}>
                    {part}
                  </kbd>
                ))
              )}
            </button>
          </li>
        ))}
      </ul>
      <p role="status" className="mt-2 min-h-6 text-note text-alarm">
        {fault}
      </p>
      <div className="mt-2 flex gap-3">
        <Button look="primary" onClick={close}>
          Done
        </Button>
        <Button onClick={() => setKeys(DEFAULT_KEYS)}>As they were</Button>
      </div>
    </Dialog>
  );
}

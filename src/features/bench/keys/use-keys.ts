import { useEffect, useRef } from 'react';
import { useBench } from '../bench-context.ts';
import { actOf } from './key-map.ts';
import { useActs } from './use-acts.ts';

/** A field takes its own keys; a button or link its own Space. */
const takesTyping = (target: EventTarget | null): boolean =>
  target instanceof HTMLElement &&
  (target.isContentEditable || target.closest('input, textarea, select, dialog') !== null);
const takesSpace = (target: EventTarget | null): boolean =>
  target instanceof HTMLElement && target.closest('button, a, summary') !== null;

/** The changeable keys, anywhere on the Bench but in fields and dialogs. */
export function useKeys(): void {
  const acts = useActs();
  const keys = useBench((state) => state.taste.keys);
  const latest = useRef({ acts, keys });
  useEffect(() => {
    latest.current = { acts, keys };
  });
  useEffect(() => {
    const onKeyDown = (event: KeyboardEvent) => {
      if (event.defaultPrevented || takesTyping(event.target)) return;
      if (event.key === ' ' && takesSpace(event.target)) return;
      const act = actOf(latest.current.keys, event);
      const run = act && latest.current.acts[act];
      if (!act) return;
      event.preventDefault();
      run?.();
    };
    window.addEventListener('keydown', onKeyDown);
    return () => window.removeEventListener('keydown', onKeyDown);
  }, []);
}

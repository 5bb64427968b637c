import { useId, useRef, useState, type FormEvent } from 'react';
import { Button } from '#src/ui/button.tsx';
import { FIELD_BOX, Fault } from '#src/ui/form/field-frame.tsx';
import { type Unlocking, unlockReplay } from './replay-api.ts';

/** Asks for the pass phrase before anything of the replay is shown. */
export function PassPhrase({
  token,
  onUnlocked,
  onFailed,
}: {
  token: string;
  onUnlocked: () => void;
  onFailed: (is: Exclude<Unlocking, 'unlocked' | 'wrong' | 'offline'>) => void;
}) {
  const id = useId();
  const box = useRef<HTMLInputElement>(null);
  const [fault, setFault] = useState<string | null>(null);
  const [busy, setBusy] = useState(false);
  const send = async (event: FormEvent) => {
    event.preventDefault();
    const phrase = box.current?.value.trim() ?? '';
    const refuse = (words: string) => {
      setFault(words);
      box.current?.focus();
    };
    if (busy) return;
    if (phrase === '') return refuse('Write the pass phrase here.');
    setBusy(true);
    const outcome = await unlockReplay(token, phrase);
    setBusy(false);
    if (outcome === 'unlocked') onUnlocked();
    else if (outcome === 'wrong')
      refuse('This is not the pass phrase. Look at capitals and spaces.');
    else if (outcome === 'offline') refuse('There is no connection. Check it, then try again.');
    else onFailed(outcome);
  };
  return (
    <main className="mx-auto max-w-form p-4 pt-12 tablet:p-12">
      <title>Pass phrase · Redshank</title>
      <h1 tabIndex={-1} className="text-title-narrow font-bold">
        Your replay asks for a pass phrase
      </h1>
      <p className="mt-3 text-sub leading-7">
        Your coach told it to you. If you do not know it, ask the person who sent the link.
      </p>
      <form noValidate className="mt-6 max-w-[24em]" onSubmit={(event) => void send(event)}>
        <label htmlFor={id} className="font-bold">
          Pass phrase
        </label>
        <input
          ref={box}
          id={id}
          type="password"
          autoComplete="off"
          autoCapitalize="none"
          maxLength={100}
          aria-invalid={fault !== null}
          aria-describedby={fault === null ? undefined : `${id}-fault`}
          className={FIELD_BOX}
        />
        <div role="alert">{fault !== null && <Fault id={`${id}-fault`}>{fault}</Fault>}</div>
        <Button type="submit" look="primary" className="mt-4" busy={busy} busyLabel="Opening…">
          Open the replay
        </Button>
      </form>
    </main>
  );
}

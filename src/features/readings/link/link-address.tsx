import { useEffect, useId, useRef, useState } from 'react';
import type { Replay } from '#shared/contracts/replays.ts';
import { Button } from '#src/ui/button.tsx';
import { FIELD_BOX } from '#src/ui/form/field-frame.tsx';
import { LinkCode } from './link-code.tsx';
import { LinkLetter } from './link-letter.tsx';

/** A link that was just made, with the address that no later answer has. */
export interface MadeLink {
  readonly replay: Replay;
  readonly url: string;
}

/** The address, shown this once: only its print is kept. */
export function LinkAddress({
  made: { replay, url: address },
  athlete,
  onDone,
}: {
  made: MadeLink;
  athlete: { readonly name: string; readonly contactEmail: string | null };
  onDone: () => void;
}) {
  const id = useId();
  const box = useRef<HTMLInputElement>(null);
  const [copied, setCopied] = useState<'not-yet' | 'yes' | 'by-hand'>('not-yet');
  useEffect(() => box.current?.select(), []);
  const copy = async () => {
    try {
      await navigator.clipboard.writeText(address);
      setCopied('yes');
    } catch {
      box.current?.select();
      setCopied('by-hand');
    }
  };
  return (
    <div className="mb-6 rounded border border-ink bg-sheet p-5">
      <label htmlFor={id} className="text-sub font-bold">
        The link is ready. Hand it over now: it is shown only this once.
      </label>
      <input ref={box} id={id} readOnly value={address} className={FIELD_BOX} />
      <div className="mt-3 flex flex-wrap items-center gap-3">
        <Button look="primary" onClick={() => void copy()}>
          Copy the address
        </Button>
        <p role="status" className="text-note">
          {copied === 'yes' && 'Copied.'}
          {copied === 'by-hand' &&
            'This browser does not copy by itself. The address is marked: copy it by hand.'}
        </p>
      </div>
      <div className="mt-6 grid items-start gap-x-8 gap-y-6 tablet:grid-cols-2">
        <LinkLetter replay={replay} address={address} contactEmail={athlete.contactEmail} />
        <LinkCode replay={replay} address={address} athlete={athlete.name} />
      </div>
      <Button className="mt-6" onClick={onDone}>
        Done
      </Button>
    </div>
  );
}

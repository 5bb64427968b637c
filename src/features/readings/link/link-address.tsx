import { useEffect, useId, useRef, useState } from 'react';
import { Button } from '#src/ui/button.tsx';
import { FIELD_BOX } from '#src/ui/form/field-frame.tsx';

/** The address, shown this once: only its print is kept. */
export function LinkAddress({ address, onDone }: { address: string; onDone: () => void }) {
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
        The link is ready. Copy it now: it is shown only this once.
      </label>
      <input ref={box} id={id} readOnly value={address} className={FIELD_BOX} />
      <div className="mt-3 flex flex-wrap items-center gap-3">
        <Button look="primary" onClick={() => void copy()}>
          Copy the address
        </Button>
        <Button onClick={onDone}>Done</Button>
        <p role="status" className="text-note">
          {copied === 'yes' && 'Copied.'}
          {copied === 'by-hand' &&
            'This browser does not copy by itself. The address is marked: copy it by hand.'}
        </p>
      </div>
    </div>
  );
}

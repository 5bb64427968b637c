import { useEffect, useRef, useState } from 'react';
import { Button } from '#src/ui/button.tsx';
import { Caution } from '#src/ui/states.tsx';
import { useStatus } from '#src/ui/status.tsx';

/** New recovery codes. They are shown this once; only their hashes are kept. */
export function RecoveryCodes({
  codes,
  doneLabel = 'I have kept them',
  onDone,
}: {
  codes: readonly string[];
  doneLabel?: string;
  onDone: () => void;
}) {
  const say = useStatus();
  const [blocked, setBlocked] = useState(false);
  const title = useRef<HTMLHeadingElement>(null);
  useEffect(() => title.current?.focus(), []);
  const copy = async () => {
    try {
      await navigator.clipboard.writeText(`${codes.join('\n')}\n`);
      setBlocked(false);
      say('The recovery codes are copied.');
    } catch {
      setBlocked(true);
    }
  };
  return (
    <div data-print-alone className="max-w-lead space-y-4">
      <h3 ref={title} tabIndex={-1} className="text-sub font-bold">
        Your recovery codes
      </h3>
      <p>
        Each signs you in to Redshank once, without your phone. Keep them where you find them if the
        phone is lost, and nobody else does.
      </p>
      <ul className="grid gap-x-8 gap-y-1 border-y border-rule py-3 font-bold tabular-nums tracking-wide tablet:grid-cols-2">
        {codes.map((code) => (
          <li key={code} className="select-all whitespace-nowrap">
            {code}
          </li>
        ))}
      </ul>
      <div className="space-y-4 print:hidden">
        <Caution>They are shown now and never again. New ones can be made at any time.</Caution>
        {blocked && <p role="alert">The browser does not let pages copy. Mark and copy them.</p>}
        <div className="flex flex-wrap gap-3">
          <Button onClick={() => void copy()}>Copy</Button>
          <Button onClick={() => window.print()}>Print</Button>
          <Button look="primary" onClick={onDone}>
            {doneLabel}
          </Button>
        </div>
      </div>
    </div>
  );
}

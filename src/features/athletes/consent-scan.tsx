import { useQueryClient } from '@tanstack/react-query';
import { useRef, useState } from 'react';
import type { Consent } from '#shared/contracts/athletes.ts';
import { MAX_SCAN_BYTES } from '#shared/contracts/consents.ts';
import { routes } from '#shared/contracts/routes.ts';
import { athletesKey } from '#src/api/athletes.queries.ts';
import { call, download, send } from '#src/api/client.ts';
import { Button } from '#src/ui/button.tsx';
import { ConfirmButton } from '#src/ui/confirm.tsx';
import { shortDay } from '#src/ui/days.ts';
import { saveAs } from '#src/ui/save-as.ts';
import { useStatus } from '#src/ui/status.tsx';

const KIND = { 'application/pdf': 'PDF', 'image/jpeg': 'JPEG', 'image/png': 'PNG' } as const;
const TOO_LARGE = 'A scan may weigh up to 10 MB. Scan it in grey at 300 dpi, or photograph it.';

/** The paper beside a consent: added, saved to look at, taken away. */
export function ConsentScan({ consent, mayChange }: { consent: Consent; mayChange: boolean }) {
  const client = useQueryClient();
  const say = useStatus();
  const input = useRef<HTMLInputElement>(null);
  const [busy, setBusy] = useState(false);
  const [fault, setFault] = useState<string | null>(null);
  const { scan } = consent;
  const params = { id: consent.id };

  const doing = async (work: () => Promise<unknown>) => {
    setBusy(true);
    setFault(null);
    try {
      await work();
    } catch (error) {
      setFault(error instanceof Error ? error.message : 'That did not work. Try again.');
    } finally {
      setBusy(false);
    }
  };
  const again = () => client.invalidateQueries({ queryKey: athletesKey });
  const add = async (file: File) => {
    if (file.size > MAX_SCAN_BYTES) throw new Error(TOO_LARGE);
    await send(routes.addConsentScan, { params, file });
    await again();
    say('The scan is kept beside the consent.');
  };
  const open = async () => {
    const { name, blob } = await download(routes.consentScan, { params });
    saveAs(name, blob);
  };
  const remove = async () => {
    await call(routes.deleteConsentScan, { params });
    await again();
    say('The scan is deleted.');
  };

  return (
    <>
      {scan && (
        <Button look="plain" className="text-note" busy={busy} onClick={() => void doing(open)}>
          Save the scan ({KIND[scan.type]}, {shortDay(scan.at.slice(0, 10))})
        </Button>
      )}
      {mayChange && (
        <>
          <input
            ref={input}
            type="file"
            accept="application/pdf,image/jpeg,image/png"
            aria-label="Scan of the paper"
            className="sr-only"
            tabIndex={-1}
            onChange={(event) => {
              const [file] = event.target.files ?? [];
              event.target.value = '';
              if (file) void doing(() => add(file));
            }}
          />
          <Button
            look="plain"
            className="text-note"
            busy={busy}
            busyLabel="Sending …"
            onClick={() => input.current?.click()}
          >
            {scan ? 'Replace the scan' : 'Add a scan of the paper'}
          </Button>
        </>
      )}
      {scan && mayChange && (
        <ConfirmButton
          look="plain"
          className="!text-alarm text-note"
          label="Delete the scan"
          title="Delete this scan?"
          confirm="Delete it"
          onConfirm={remove}
        >
          <p>The consent itself stays as it was recorded. The file cannot be brought back.</p>
        </ConfirmButton>
      )}
      {fault !== null && (
        <p role="alert" className="basis-full font-bold text-alarm">
          {fault}
        </p>
      )}
    </>
  );
}

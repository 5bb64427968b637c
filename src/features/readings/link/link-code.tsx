import { useEffect, useState } from 'react';
import { flushSync } from 'react-dom';
import type { Replay } from '#shared/contracts/replays.ts';
import { Button } from '#src/ui/button.tsx';
import { moment } from '#src/ui/days.ts';
import { QrCode } from '#src/ui/qr/qr-code.tsx';

/** The address for the camera of a phone that is held to the screen, or to a sheet of paper. */
export function LinkCode({
  replay,
  address,
  athlete,
}: {
  replay: Replay;
  address: string;
  athlete: string;
}) {
  const [printing, setPrinting] = useState(false);
  useEffect(() => {
    const done = () => setPrinting(false);
    window.addEventListener('afterprint', done);
    return () => window.removeEventListener('afterprint', done);
  }, []);
  const print = () => {
    flushSync(() => setPrinting(true));
    window.print();
  };
  return (
    <div>
      <div data-print-alone={printing ? '' : undefined}>
        <p className="hidden text-filled font-bold print:block">{athlete}’s replay</p>
        <div className="mt-2 print:w-[12cm]">
          <QrCode text={address} label="QR code of the link" size="large" />
        </div>
        <p className="mt-2 max-w-form text-note">
          Point the phone’s camera at it.
          <span className="hidden print:inline">
            {' '}
            It opens until {moment(replay.expiresAt)}
            {replay.passPhrase && ' and asks for the pass phrase you were told'}. Whoever has this
            sheet can open it.
          </span>
        </p>
        <p className="mt-2 hidden break-all text-note print:block">{address}</p>
      </div>
      <Button className="mt-3" onClick={print}>
        Print the code
      </Button>
    </div>
  );
}

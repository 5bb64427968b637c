import { useState } from 'react';
import { routes } from '#shared/contracts/routes.ts';
import { addressOf } from '#src/api/client.ts';
import { buttonClass, Button } from '#src/ui/button.tsx';
import { EraseDialog } from './erase-dialog.tsx';

/** Everything of one person: to save as an archive, or to erase. */
export function PersonActions({ athlete }: { athlete: { id: string; name: string } }) {
  const [erasing, setErasing] = useState(false);
  return (
    <span className="inline-flex flex-wrap items-center gap-x-5">
      <a
        href={addressOf(routes.exportAthlete, { params: { id: athlete.id } })}
        download
        className={buttonClass('plain')}
      >
        Export<span className="sr-only"> everything of {athlete.name}</span>
      </a>
      <Button look="plain" className="!text-alarm" onClick={() => setErasing(true)}>
        Erase …<span className="sr-only"> {athlete.name}</span>
      </Button>
      {erasing && <EraseDialog athlete={athlete} onClose={() => setErasing(false)} />}
    </span>
  );
}

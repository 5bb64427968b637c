import { useState } from 'react';
import { routes } from '#shared/contracts/routes.ts';
import { call } from '#src/api/client.ts';
import type { Me } from '#shared/contracts/accounts.ts';
import { Button } from '#src/ui/button.tsx';
import { ErrorState } from '#src/ui/states.tsx';
import { Door } from '../door.tsx';
import { SetUpCodes } from './set-up-codes.tsx';

/** In place of every page, for an owner whose practice asks for one-time codes that are not set up yet. */
export function CodesFirstPage({
  me: { user, practice },
  onDone,
  onOut,
}: {
  me: Me;
  onDone: () => void;
  onOut: () => void;
}) {
  const [error, setError] = useState<unknown>(null);
  const signOut = async () => {
    try {
      await call(routes.signOut, {});
      onOut();
    } catch (problem) {
      setError(problem);
    }
  };
  return (
    <Door
      title="Set up one-time codes"
      lead={
        <>
          {practice.name} asks its owners for them, because owners see every athlete. It takes two
          minutes and a phone. You are signed in as{' '}
          <b className="break-words text-ink">{user.email}</b>.
        </>
      }
    >
      <SetUpCodes onDone={onDone} />
      {error !== null && (
        <div className="mt-5">
          <ErrorState error={error} />
        </div>
      )}
      <Button look="plain" className="mt-3 print:hidden" onClick={() => void signOut()}>
        Sign out
      </Button>
    </Door>
  );
}

import { useState } from 'react';
import { Link } from 'react-router-dom';
import type { MailLinkLook } from '#shared/contracts/mail-links.ts';
import { routes } from '#shared/contracts/routes.ts';
import { call } from '#src/api/client.ts';
import { Button } from '#src/ui/button.tsx';
import { paths } from '#src/ui/paths.ts';
import { ErrorState } from '#src/ui/states.tsx';
import { Door } from './door.tsx';
import { MailLinkDoor } from './mail-link-door.tsx';

const TITLE = 'Confirm the e-mail address';

/** Confirms a change of address by a press: a program that only looks at links in letters confirms nothing. */
export function ConfirmEmailPage() {
  return (
    <MailLinkDoor
      title={TITLE}
      kinds={['email-from', 'email-to']}
      instead={<p>Ask for the change once more on your account’s page.</p>}
    >
      {(link, token) => <Confirm link={link} token={token} />}
    </MailLinkDoor>
  );
}

function Confirm({ link, token }: { link: MailLinkLook; token: string }) {
  const [done, setDone] = useState<boolean | null>(null);
  const [busy, setBusy] = useState(false);
  const [error, setError] = useState<unknown>(null);
  const confirm = async () => {
    setBusy(true);
    setError(null);
    try {
      setDone((await call(routes.confirmEmail, { body: { token } })).done);
    } catch (problem) {
      setError(problem);
    } finally {
      setBusy(false);
    }
  };
  return (
    <Door
      title={TITLE}
      lead={
        <>
          The account is to sign in with <b className="break-words text-ink">{link.newEmail}</b>{' '}
          from now on.
        </>
      }
    >
      <div role="status" className="space-y-3">
        {done === true && <p>Both are confirmed. Sign in with the new address from now on.</p>}
        {done === false && (
          <p>
            Confirmed. The other letter still waits; the change holds once that is confirmed too.
          </p>
        )}
        {done !== null && <Link to={paths.signIn()}>To the sign-in</Link>}
      </div>
      {error !== null && <ErrorState error={error} />}
      {done === null && (
        <Button
          look="primary"
          className="mt-5 w-full"
          busy={busy}
          busyLabel="Confirming …"
          onClick={() => void confirm()}
        >
          Confirm
        </Button>
      )}
    </Door>
  );
}

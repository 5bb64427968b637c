import { useNavigate, Link } from 'react-router-dom';
import * as z from 'zod';
import { newPassword } from '#shared/contracts/accounts.ts';
import { routes } from '#shared/contracts/routes.ts';
import { call } from '#src/api/client.ts';
import { Button } from '#src/ui/button.tsx';
import { Form } from '#src/ui/form/form.tsx';
import { TextField } from '#src/ui/form/text-field.tsx';
import { useZodForm } from '#src/ui/form/use-zod-form.ts';
import { paths } from '#src/ui/paths.ts';
import { useStatus } from '#src/ui/status.tsx';
import { Door } from './door.tsx';
import { MailLinkDoor } from './mail-link-door.tsx';

const TITLE = 'Choose a new password';

/** Sets a new password by the link of a letter. */
export function ResetPage() {
  return (
    <MailLinkDoor
      title={TITLE}
      kinds={['reset']}
      instead={
        <p>
          <Link to={paths.forgot()}>Ask for a new letter</Link>
        </p>
      }
    >
      {({ email }, token) => <NewPassword email={email} token={token} />}
    </MailLinkDoor>
  );
}

const body = z.object({ password: newPassword });

function NewPassword({ email, token }: { email: string; token: string }) {
  const form = useZodForm(body, { password: '' });
  const navigate = useNavigate();
  const say = useStatus();
  return (
    <Door
      title={TITLE}
      lead={
        <>
          For <b className="break-words text-ink">{email}</b>. You are then signed out on every
          device.
        </>
      }
    >
      <Form
        form={form}
        className="space-y-5"
        send={async ({ password }) => {
          await call(routes.resetPassword, { body: { token, password } });
          await navigate(paths.signIn(), { replace: true });
          say('Your new password holds. Sign in with it.');
        }}
      >
        <TextField
          name="password"
          type="password"
          label="New password"
          hint="At least 12 characters. A few words in a row are good."
          autoComplete="new-password"
        />
        <Button
          type="submit"
          look="primary"
          className="w-full"
          busy={form.formState.isSubmitting}
          busyLabel="Saving …"
        >
          Set the password
        </Button>
      </Form>
    </Door>
  );
}

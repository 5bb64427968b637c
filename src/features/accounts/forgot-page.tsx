import { useState } from 'react';
import { Link } from 'react-router-dom';
import { forgotBody } from '#shared/contracts/mail-links.ts';
import { routes } from '#shared/contracts/routes.ts';
import { call } from '#src/api/client.ts';
import { Button } from '#src/ui/button.tsx';
import { Form } from '#src/ui/form/form.tsx';
import { TextField } from '#src/ui/form/text-field.tsx';
import { useZodForm } from '#src/ui/form/use-zod-form.ts';
import { paths } from '#src/ui/paths.ts';
import { Door } from './door.tsx';
import { LetterSent } from './letter-sent.tsx';

/** Asks for the letter that sets a new password. */
export function ForgotPage() {
  const form = useZodForm(forgotBody, { email: '' });
  const [sentTo, setSentTo] = useState<string | null>(null);
  if (sentTo !== null) return <LetterSent email={sentTo} lasts="one hour" />;
  return (
    <Door
      title="Forgotten password"
      lead="Write the e-mail address that you sign in with. You get a letter with a link that sets a new password."
    >
      <Form
        form={form}
        className="space-y-5"
        send={async (body) => {
          await call(routes.forgot, { body });
          setSentTo(body.email);
        }}
      >
        <TextField name="email" type="email" label="E-mail" autoComplete="username" />
        <Button
          type="submit"
          look="primary"
          className="w-full"
          busy={form.formState.isSubmitting}
          busyLabel="Asking …"
        >
          Send the letter
        </Button>
        <p>
          <Link to={paths.signIn()}>To the sign-in</Link>
        </p>
      </Form>
    </Door>
  );
}

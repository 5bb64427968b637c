import { useState } from 'react';
import { Link } from 'react-router-dom';
import { startBody } from '#shared/contracts/mail-links.ts';
import { routes } from '#shared/contracts/routes.ts';
import { call } from '#src/api/client.ts';
import { Button } from '#src/ui/button.tsx';
import { Form } from '#src/ui/form/form.tsx';
import { TextField } from '#src/ui/form/text-field.tsx';
import { useZodForm } from '#src/ui/form/use-zod-form.ts';
import { paths } from '#src/ui/paths.ts';
import { Door } from './door.tsx';
import { LetterSent } from './letter-sent.tsx';

/** Asks for the letter that starts a new practice. */
export function StartPage() {
  const form = useZodForm(startBody, { practiceName: '', name: '', email: '' });
  const [sentTo, setSentTo] = useState<string | null>(null);
  if (sentTo !== null) return <LetterSent email={sentTo} lasts="a day" />;
  return (
    <Door
      title="Start a practice"
      lead="A clinic, a club, a school. You become its owner and invite the others. Does your practice use Redshank already? Then ask its owner to invite you."
    >
      <Form
        form={form}
        className="space-y-5"
        send={async (body) => {
          await call(routes.startPractice, { body });
          setSentTo(body.email);
        }}
      >
        <TextField name="practiceName" label="Name of the practice" autoComplete="organization" />
        <TextField name="name" label="Your name" autoComplete="name" />
        <TextField
          name="email"
          type="email"
          label="Your e-mail"
          hint="You will sign in with it."
          autoComplete="username"
        />
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

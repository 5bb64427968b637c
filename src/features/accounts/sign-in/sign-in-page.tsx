import { useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { Link, useNavigate, useSearchParams } from 'react-router-dom';
import { type Me, signInBody } from '#shared/contracts/accounts.ts';
import { routes } from '#shared/contracts/routes.ts';
import { call } from '#src/api/client.ts';
import { Button } from '#src/ui/button.tsx';
import { Form } from '#src/ui/form/form.tsx';
import { TextField } from '#src/ui/form/text-field.tsx';
import { useZodForm } from '#src/ui/form/use-zod-form.ts';
import { paths } from '#src/ui/paths.ts';
import { ErrorState } from '#src/ui/states.tsx';
import { Door } from '../door.tsx';
import { enter } from '../enter.ts';
import { CodeStep } from './code-step.tsx';
import { ownPlace } from './own-place.ts';

/** Opens a session and goes on to where the person wanted to be. */
export function SignInPage() {
  const [half, setHalf] = useState(false);
  const [gone, setGone] = useState<string | null>(null);
  const client = useQueryClient();
  const navigate = useNavigate();
  const [search] = useSearchParams();
  const place = ownPlace(search.get('to'));
  const go = async (me: Me) => {
    enter(client, me);
    await navigate(place, { replace: true });
  };
  if (half)
    return (
      <CodeStep
        onIn={go}
        onGone={(why) => {
          setGone(why);
          setHalf(false);
        }}
      />
    );
  return (
    <Door
      title="Sign in"
      lead={
        place === '/'
          ? 'For the people of a practice. Athletes open their replay from the link they were given.'
          : 'You are led back to where you were.'
      }
    >
      {gone !== null && (
        <div className="mb-6">
          <ErrorState error={new Error(gone)} />
        </div>
      )}
      <PasswordStep
        onHalf={() => {
          setGone(null);
          setHalf(true);
        }}
        onIn={go}
      />
    </Door>
  );
}

function PasswordStep({ onHalf, onIn }: { onHalf: () => void; onIn: (me: Me) => Promise<void> }) {
  const form = useZodForm(signInBody, { email: '', password: '' });
  return (
    <Form
      form={form}
      className="space-y-5"
      send={async (body) => {
        const answer = await call(routes.signIn, { body });
        if ('codeNeeded' in answer) onHalf();
        else await onIn(answer);
      }}
    >
      <TextField name="email" type="email" label="E-mail" autoComplete="username" />
      <TextField name="password" type="password" label="Password" autoComplete="current-password" />
      <Button
        type="submit"
        look="primary"
        className="w-full"
        busy={form.formState.isSubmitting}
        busyLabel="Signing in …"
      >
        Sign in
      </Button>
      <p className="flex flex-wrap justify-between gap-x-6 gap-y-1">
        <Link to={paths.forgot()}>Forgotten password</Link>
        <Link to={paths.start()}>Start a practice</Link>
      </p>
    </Form>
  );
}

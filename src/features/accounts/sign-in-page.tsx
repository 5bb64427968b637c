import { useQueryClient } from '@tanstack/react-query';
import { useNavigate, useSearchParams } from 'react-router-dom';
import { signInBody } from '#shared/contracts/accounts.ts';
import { routes } from '#shared/contracts/routes.ts';
import { meQuery } from '#src/api/accounts.queries.ts';
import { call } from '#src/api/client.ts';
import { discardAll } from '#src/api/leaving.ts';
import { Bird } from '#src/ui/bird.tsx';
import { Button } from '#src/ui/button.tsx';
import { Form } from '#src/ui/form/form.tsx';
import { TextField } from '#src/ui/form/text-field.tsx';
import { useZodForm } from '#src/ui/form/use-zod-form.ts';
import { ownPlace } from './own-place.ts';

/** Opens a session and goes on to where the person wanted to be. */
export function SignInPage() {
  const form = useZodForm(signInBody, { email: '', password: '' });
  const client = useQueryClient();
  const navigate = useNavigate();
  const [search] = useSearchParams();
  const place = ownPlace(search.get('to'));
  return (
    <main className="mx-auto w-full max-w-[432px] px-4 pb-16 pt-10 tablet:pt-24">
      <title>Sign in · Redshank</title>
      <p className="mb-8 flex items-center gap-2 text-sub font-bold">
        <Bird />
        Redshank
      </p>
      <h1
        tabIndex={-1}
        className="text-title-narrow font-bold tracking-[-0.015em] tablet:text-title"
      >
        Sign in
      </h1>
      <p className="mb-8 mt-2 text-soft">
        {place === '/'
          ? 'For the people of a practice. Athletes open their replay from the link they were given.'
          : 'You are led back to where you were.'}
      </p>
      <Form
        form={form}
        className="space-y-5"
        send={async (body) => {
          const me = await call(routes.signIn, { body });
          // nothing of another person may be left; one's own unsent work goes on
          if (client.getQueryData(meQuery.queryKey)?.user.id !== me.user.id) discardAll();
          client.clear();
          client.setQueryData(meQuery.queryKey, me);
          await navigate(place, { replace: true });
        }}
      >
        <TextField name="email" type="email" label="E-mail" autoComplete="username" />
        <TextField
          name="password"
          type="password"
          label="Password"
          autoComplete="current-password"
        />
        <Button
          type="submit"
          look="primary"
          className="w-full"
          busy={form.formState.isSubmitting}
          busyLabel="Signing in …"
        >
          Sign in
        </Button>
      </Form>
    </main>
  );
}

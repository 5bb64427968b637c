import { useEffect, useState } from 'react';
import { codeBody } from '#shared/contracts/one-time-codes.ts';
import type { Me } from '#shared/contracts/accounts.ts';
import { routes } from '#shared/contracts/routes.ts';
import { call } from '#src/api/client.ts';
import { isProblem } from '#src/api/problem.ts';
import { Button } from '#src/ui/button.tsx';
import { Form } from '#src/ui/form/form.tsx';
import { TextField } from '#src/ui/form/text-field.tsx';
import { useZodForm } from '#src/ui/form/use-zod-form.ts';
import { Door } from '../door.tsx';

/** The second step of a sign-in: the code that one's phone shows, or a recovery code in its place. */
export function CodeStep({
  onIn,
  onGone,
}: {
  onIn: (me: Me) => Promise<void>;
  /** The first step has to be done again. */
  onGone: (why: string | null) => void;
}) {
  const [recovery, setRecovery] = useState(false);
  return (
    <Door
      title={recovery ? 'Recovery code' : 'One-time code'}
      lead={
        recovery
          ? 'One of those that you kept when you set up one-time codes. Each works once.'
          : 'Open the app on your phone that makes your codes, and write the one for Redshank here.'
      }
    >
      <CodeForm key={String(recovery)} recovery={recovery} onIn={onIn} onGone={onGone} />
      <p className="mt-5 flex flex-wrap justify-between gap-x-6">
        <Button look="plain" onClick={() => setRecovery(!recovery)}>
          {recovery ? 'Use a code of my phone' : 'Phone not at hand? Use a recovery code'}
        </Button>
        <Button look="plain" onClick={() => onGone(null)}>
          Start again
        </Button>
      </p>
    </Door>
  );
}

function CodeForm({
  recovery,
  onIn,
  onGone,
}: { recovery: boolean } & Parameters<typeof CodeStep>[0]) {
  const form = useZodForm(codeBody, { code: '' });
  const { setFocus } = form;
  useEffect(() => setFocus('code'), [setFocus]);
  return (
    <Form
      form={form}
      className="space-y-5"
      send={async (body) => {
        const me = await call(routes.signInCode, { body }).catch((error: unknown) => {
          if (!isProblem(error, 'half-gone')) throw error;
          onGone(error.message);
          return null;
        });
        if (me) await onIn(me);
      }}
    >
      {recovery ? (
        <TextField name="code" label="Recovery code" hint="Sixteen letters and digits." />
      ) : (
        <TextField
          name="code"
          label="Code"
          hint="Six digits. It changes every half minute."
          inputMode="numeric"
          autoComplete="one-time-code"
        />
      )}
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
  );
}

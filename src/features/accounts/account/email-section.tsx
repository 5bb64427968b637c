import { useQueryClient } from '@tanstack/react-query';
import { type Account, emailBody } from '#shared/contracts/accounts.ts';
import { routes } from '#shared/contracts/routes.ts';
import { accountQuery } from '#src/api/accounts.queries.ts';
import { call } from '#src/api/client.ts';
import { Button } from '#src/ui/button.tsx';
import { ConfirmButton } from '#src/ui/confirm.tsx';
import { dayOf } from '#src/ui/days.ts';
import { Form } from '#src/ui/form/form.tsx';
import { TextField } from '#src/ui/form/text-field.tsx';
import { useZodForm } from '#src/ui/form/use-zod-form.ts';
import { useStatus } from '#src/ui/status.tsx';

export function EmailSection({ account: { email, emailChange } }: { account: Account }) {
  return (
    <>
      <p className="mb-5 break-words">
        Now <b>{email}</b>
      </p>
      {emailChange ? <Waiting change={emailChange} /> : <EmailForm />}
    </>
  );
}

const isConfirmed = (yes: boolean) => (yes ? 'confirmed' : 'not confirmed yet');

function Waiting({ change }: { change: NonNullable<Account['emailChange']> }) {
  const client = useQueryClient();
  const say = useStatus();
  return (
    <div className="max-w-lead space-y-3">
      <p className="break-words">
        It becomes <b>{change.to}</b> once both letters are confirmed, until {dayOf(change.until)}:
      </p>
      <ul className="list-disc pl-5">
        <li>from the address so far: {isConfirmed(change.confirmedFromOld)}</li>
        <li>from the new address: {isConfirmed(change.confirmedFromNew)}</li>
      </ul>
      <ConfirmButton
        label="Give it up"
        title="Keep your address as it is?"
        confirm="Give the change up"
        onConfirm={async () => {
          client.setQueryData(accountQuery.queryKey, await call(routes.dropEmailChange, {}));
          say('Your address stays as it is.');
        }}
      >
        <p>The links in both letters then open nothing.</p>
      </ConfirmButton>
    </div>
  );
}

function EmailForm() {
  const form = useZodForm(emailBody, { email: '', password: '' });
  const client = useQueryClient();
  const say = useStatus();
  return (
    <Form
      form={form}
      className="max-w-[432px] space-y-5"
      send={async (body) => {
        client.setQueryData(accountQuery.queryKey, await call(routes.changeEmail, { body }));
        say('Two letters are on their way. Confirm both.');
      }}
    >
      <TextField
        name="email"
        type="email"
        label="New e-mail"
        hint="A letter goes to each of the two addresses."
        autoComplete="email"
      />
      <TextField
        name="password"
        type="password"
        label="Your password"
        autoComplete="current-password"
      />
      <Button type="submit" busy={form.formState.isSubmitting} busyLabel="Asking …">
        Send the letters
      </Button>
    </Form>
  );
}

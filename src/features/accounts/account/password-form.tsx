import { useQueryClient } from '@tanstack/react-query';
import { passwordBody } from '#shared/contracts/accounts.ts';
import { routes } from '#shared/contracts/routes.ts';
import { sessionsQuery } from '#src/api/accounts.queries.ts';
import { call } from '#src/api/client.ts';
import { Button } from '#src/ui/button.tsx';
import { Form } from '#src/ui/form/form.tsx';
import { TextField } from '#src/ui/form/text-field.tsx';
import { useZodForm } from '#src/ui/form/use-zod-form.ts';
import { useStatus } from '#src/ui/status.tsx';

export function PasswordForm() {
  const form = useZodForm(passwordBody, { current: '', next: '' });
  const client = useQueryClient();
  const say = useStatus();
  return (
    <Form
      form={form}
      className="max-w-[432px] space-y-5"
      send={async (body) => {
        await call(routes.changePassword, { body });
        form.reset();
        await client.invalidateQueries({ queryKey: sessionsQuery.queryKey });
        say('Your new password holds. You are signed out everywhere else.');
      }}
    >
      <TextField
        name="current"
        type="password"
        label="Present password"
        autoComplete="current-password"
      />
      <TextField
        name="next"
        type="password"
        label="New password"
        hint="At least 12 characters. A few words in a row are good."
        autoComplete="new-password"
      />
      <Button type="submit" busy={form.formState.isSubmitting} busyLabel="Saving …">
        Change the password
      </Button>
    </Form>
  );
}

import { useQueryClient } from '@tanstack/react-query';
import { nameBody } from '#shared/contracts/accounts.ts';
import { routes } from '#shared/contracts/routes.ts';
import { accountQuery, meQuery } from '#src/api/accounts.queries.ts';
import { call } from '#src/api/client.ts';
import { Button } from '#src/ui/button.tsx';
import { Form } from '#src/ui/form/form.tsx';
import { TextField } from '#src/ui/form/text-field.tsx';
import { useZodForm } from '#src/ui/form/use-zod-form.ts';
import { useStatus } from '#src/ui/status.tsx';

export function NameForm({ name }: { name: string }) {
  const form = useZodForm(nameBody, { name });
  const client = useQueryClient();
  const say = useStatus();
  return (
    <Form
      form={form}
      className="max-w-[432px] space-y-5"
      send={async (body) => {
        client.setQueryData(accountQuery.queryKey, await call(routes.changeName, { body }));
        await client.invalidateQueries({ queryKey: meQuery.queryKey });
        say('Your name is saved.');
      }}
    >
      <TextField name="name" label="Your name" autoComplete="name" />
      <Button type="submit" busy={form.formState.isSubmitting} busyLabel="Saving …">
        Save the name
      </Button>
    </Form>
  );
}

import { useQueryClient } from '@tanstack/react-query';
import { inviteBody } from '#shared/contracts/people.ts';
import { routes } from '#shared/contracts/routes.ts';
import { call } from '#src/api/client.ts';
import { peopleQuery } from '#src/api/people.queries.ts';
import { Button } from '#src/ui/button.tsx';
import { Form } from '#src/ui/form/form.tsx';
import { SelectField, TextField } from '#src/ui/form/text-field.tsx';
import { useZodForm } from '#src/ui/form/use-zod-form.ts';
import { useStatus } from '#src/ui/status.tsx';
import { ROLES } from './role-words.ts';

export function InviteForm() {
  const form = useZodForm(inviteBody, { email: '', role: 'coach' });
  const client = useQueryClient();
  const say = useStatus();
  return (
    <Form
      form={form}
      className="max-w-[432px] space-y-5"
      send={async (body) => {
        client.setQueryData(peopleQuery.queryKey, await call(routes.invite, { body }));
        form.reset();
        say(`${body.email} is invited.`);
      }}
    >
      <TextField name="email" type="email" label="E-mail" />
      <SelectField
        name="role"
        label="Role"
        hint="A coach films and marks their own athletes. A supervisor sees those of the coaches you name. An owner sees and manages all."
        options={ROLES}
      />
      <Button
        type="submit"
        look="primary"
        busy={form.formState.isSubmitting}
        busyLabel="Inviting …"
      >
        Send the invitation
      </Button>
    </Form>
  );
}

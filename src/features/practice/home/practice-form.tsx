import { useQueryClient } from '@tanstack/react-query';
import type * as z from 'zod';
import { practiceBody, type PracticeSettings } from '#shared/contracts/practice.ts';
import { routes } from '#shared/contracts/routes.ts';
import { meQuery } from '#src/api/accounts.queries.ts';
import { call } from '#src/api/client.ts';
import { practiceQuery } from '#src/api/practice.queries.ts';
import { Button } from '#src/ui/button.tsx';
import { Form } from '#src/ui/form/form.tsx';
import { TextField } from '#src/ui/form/text-field.tsx';
import { useZodForm } from '#src/ui/form/use-zod-form.ts';
import { useStatus } from '#src/ui/status.tsx';

type Fields = z.input<typeof practiceBody>;

/** The owner's form: how the practice is called, and how an athlete reaches it. */
export function PracticeForm({ settings }: { settings: PracticeSettings }) {
  const client = useQueryClient();
  const say = useStatus();
  const form = useZodForm(practiceBody, settings);
  const send = async (body: Fields) => {
    const answer = await call(routes.changePractice, { body });
    client.setQueryData(practiceQuery.queryKey, answer);
    form.reset(answer);
    // the name stands at the top of every page
    await client.invalidateQueries({ queryKey: meQuery.queryKey });
    say('Saved. Replays that are open show it when they are opened again.');
  };
  return (
    <Form form={form} send={send} className="max-w-form space-y-5">
      <TextField<Fields>
        name="name"
        label="Name"
        hint="As athletes know it: on their replay, and in mails."
      />
      <TextField<Fields>
        name="contact"
        label="How athletes reach you"
        hint="A phone number or an e-mail address. The replay says to stop and call if it hurts."
        optional
      />
      <Button type="submit" busy={form.formState.isSubmitting} busyLabel="Saving…">
        Save
      </Button>
    </Form>
  );
}

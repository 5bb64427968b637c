import { useState } from 'react';
import { type Replay, sendReplayBody } from '#shared/contracts/replays.ts';
import { routes } from '#shared/contracts/routes.ts';
import { call } from '#src/api/client.ts';
import { Button } from '#src/ui/button.tsx';
import { Form } from '#src/ui/form/form.tsx';
import { TextField } from '#src/ui/form/text-field.tsx';
import { useZodForm } from '#src/ui/form/use-zod-form.ts';

const letterBody = sendReplayBody.pick({ email: true });

/** Sends the address on while it is still known; where it went is kept on this page alone. */
export function LinkLetter({
  replay,
  address,
  contactEmail,
}: {
  replay: Replay;
  address: string;
  contactEmail: string | null;
}) {
  const [sentTo, setSentTo] = useState<string | null>(null);
  const form = useZodForm(letterBody, { email: contactEmail ?? '' });
  const token = address.slice(address.lastIndexOf('/') + 1);
  return (
    <Form
      form={form}
      send={async ({ email }) => {
        setSentTo(null);
        await call(routes.sendReplay, { params: { id: replay.id }, body: { token, email } });
        setSentTo(email);
      }}
    >
      <TextField
        name="email"
        type="email"
        inputMode="email"
        label="Send it by e-mail to"
        hint={
          contactEmail === null
            ? 'The athlete’s, or the guardian’s of a minor. It is not kept.'
            : 'From the athlete’s page. Another address is not kept.'
        }
      />
      <div className="mt-3 flex flex-wrap items-center gap-3">
        <Button type="submit" busy={form.formState.isSubmitting} busyLabel="Sending…">
          Send the link
        </Button>
        <p role="status" className="text-note">
          {sentTo !== null && `Sent to ${sentTo}.`}
        </p>
      </div>
    </Form>
  );
}

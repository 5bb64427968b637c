import { useQueryClient } from '@tanstack/react-query';
import { Link, useNavigate } from 'react-router-dom';
import { joinBody, type MailLinkLook } from '#shared/contracts/mail-links.ts';
import { routes } from '#shared/contracts/routes.ts';
import { call } from '#src/api/client.ts';
import { Button } from '#src/ui/button.tsx';
import { Form } from '#src/ui/form/form.tsx';
import { TextField } from '#src/ui/form/text-field.tsx';
import { useZodForm } from '#src/ui/form/use-zod-form.ts';
import { paths } from '#src/ui/paths.ts';
import { Door } from './door.tsx';
import { enter } from './enter.ts';
import { MailLinkDoor } from './mail-link-door.tsx';

/** Makes the account that a letter invites to, or starts a practice. */
export function JoinPage() {
  return (
    <MailLinkDoor
      title="Join a practice"
      kinds={['invitation', 'start']}
      instead={
        <p>
          Ask who invited you for a new invitation, or{' '}
          <Link to={paths.start()}>start a practice of your own</Link>.
        </p>
      }
    >
      {(link, token) => <Join link={link} token={token} />}
    </MailLinkDoor>
  );
}

const AS = { owner: 'an owner', supervisor: 'a supervisor', coach: 'a coach' } as const;

function Join({ link, token }: { link: MailLinkLook; token: string }) {
  const form = useZodForm(joinBody, { token, name: link.personName, password: '' });
  const client = useQueryClient();
  const navigate = useNavigate();
  const starts = link.kind === 'start';
  return (
    <Door
      title={`${starts ? 'Start' : 'Join'} ${link.practiceName}`}
      lead={
        <>
          You will be {AS[link.role ?? 'owner']} and sign in with{' '}
          <b className="break-words text-ink">{link.email}</b>.
        </>
      }
    >
      <Form
        form={form}
        className="space-y-5"
        send={async (body) => {
          enter(client, await call(routes.join, { body }));
          await navigate(paths.today(), { replace: true });
        }}
      >
        <TextField name="name" label="Your name" autoComplete="name" />
        <TextField
          name="password"
          type="password"
          label="Password"
          hint="At least 12 characters. A few words in a row are good."
          autoComplete="new-password"
        />
        <Button
          type="submit"
          look="primary"
          className="w-full"
          busy={form.formState.isSubmitting}
          busyLabel="Making your account …"
        >
          {starts ? 'Start the practice' : 'Join the practice'}
        </Button>
      </Form>
    </Door>
  );
}

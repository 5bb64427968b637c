import { useQueryClient } from '@tanstack/react-query';
import type { Invitation } from '#shared/contracts/people.ts';
import { routes } from '#shared/contracts/routes.ts';
import { call } from '#src/api/client.ts';
import { peopleQuery } from '#src/api/people.queries.ts';
import { Button } from '#src/ui/button.tsx';
import { ConfirmButton } from '#src/ui/confirm.tsx';
import { dayOf } from '#src/ui/days.ts';
import { Empty } from '#src/ui/states.tsx';
import { useStatus } from '#src/ui/status.tsx';
import { Table, type Column } from '#src/ui/table.tsx';
import { roleLabel } from './role-words.ts';

export function Invitations({ invitations }: { invitations: readonly Invitation[] }) {
  if (invitations.length === 0)
    return <Empty title="Nobody">Every invitation was answered, ended or has lapsed.</Empty>;
  return (
    <Table
      caption="Open invitations"
      columns={COLUMNS}
      rows={invitations}
      rowKey={({ id }) => id}
    />
  );
}

const COLUMNS: Column<Invitation>[] = [
  {
    key: 'email',
    label: 'E-mail',
    cell: ({ email, invitedBy }) => (
      <>
        <b className="break-words">{email}</b>
        <span className="block text-note text-soft">invited by {invitedBy}</span>
      </>
    ),
  },
  { key: 'role', label: 'Role', cell: ({ role }) => roleLabel(role) },
  {
    key: 'letter',
    label: 'Letter',
    cell: ({ sentAt }) =>
      sentAt === null ? <span className="text-ochre">not sent yet</span> : `sent ${dayOf(sentAt)}`,
  },
  { key: 'until', label: 'Works until', cell: ({ expiresAt }) => dayOf(expiresAt) },
  {
    key: 'acts',
    label: 'Change',
    heading: <span className="sr-only">Change</span>,
    end: true,
    cell: (own) => <Acts invitation={own} />,
  },
];

function Acts({ invitation: { id, email, role } }: { invitation: Invitation }) {
  const client = useQueryClient();
  const say = useStatus();
  const again = async () => {
    try {
      const body = { email, role };
      client.setQueryData(peopleQuery.queryKey, await call(routes.invite, { body }));
      say(`A new letter goes to ${email}. The link of the earlier one is ended.`);
    } catch (error) {
      say(error instanceof Error ? error.message : 'That did not work.');
    }
  };
  return (
    <span className="inline-flex gap-5">
      <Button look="plain" className="-my-2.5" onClick={() => void again()}>
        Send again
      </Button>
      <ConfirmButton
        look="plain"
        className="-my-2.5 !text-alarm"
        label="End"
        title={`End the invitation of ${email}?`}
        confirm="End it"
        onConfirm={async () => {
          await call(routes.withdrawInvitation, { params: { id } });
          await client.invalidateQueries({ queryKey: peopleQuery.queryKey });
          say(`The invitation of ${email} is ended.`);
        }}
      >
        <p>The link in the letter opens nothing from then on.</p>
      </ConfirmButton>
    </span>
  );
}

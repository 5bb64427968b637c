import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { useNavigate } from 'react-router-dom';
import { routes } from '#shared/contracts/routes.ts';
import { call } from '#src/api/client.ts';
import { discardAll, whatWouldBeLost } from '#src/api/leaving.ts';
import { useMe } from '#src/api/me.ts';
import { Button } from '#src/ui/button.tsx';
import { ButtonLink } from '#src/ui/button-link.tsx';
import { Dialog } from '#src/ui/dialog.tsx';
import { Disclosure } from '#src/ui/disclosure.tsx';
import { initials } from '#src/ui/initials.ts';
import { paths } from '#src/ui/paths.ts';
import { useStatus } from '#src/ui/status.tsx';

type Where = 'here' | 'everywhere';

/** Who is signed in, and how to leave. */
export function PersonMenu() {
  const { user, practice } = useMe();
  const client = useQueryClient();
  const navigate = useNavigate();
  const say = useStatus();
  const [lost, setLost] = useState<{ where: Where; sentences: string[] } | null>(null);

  const leave = useMutation({
    mutationFn: (where: Where) =>
      where === 'here' ? call(routes.signOut, {}) : call(routes.signOutEverywhere, {}),
    onSuccess: async (_, where) => {
      await navigate(paths.signIn());
      client.clear();
      discardAll();
      say(where === 'here' ? 'You are signed out.' : 'You are signed out on every device.');
    },
    onError: (error) => say(`You are still signed in. ${error.message}`),
  });
  const ask = async (where: Where) => {
    const sentences = await whatWouldBeLost();
    if (sentences.length > 0) setLost({ where, sentences });
    else leave.mutate(where);
  };

  return (
    <>
      <Disclosure
        label={`${user.name}, your account`}
        panelClassName="w-72 p-5"
        button={
          <span className="grid h-8 w-8 place-items-center rounded border border-edge bg-sheet text-caption font-bold">
            {initials(user.name)}
          </span>
        }
      >
        <p className="font-bold">{user.name}</p>
        <p className="break-words text-note text-soft">{user.email}</p>
        <p className="text-note text-soft">
          {user.role}, {practice.name}
        </p>
        <div className="mt-3 flex flex-col items-start border-t border-rule pt-2">
          <ButtonLink look="plain" to={paths.account()}>
            Your account
          </ButtonLink>
          {user.role === 'owner' && (
            <ButtonLink look="plain" to={paths.people()}>
              People of the practice
            </ButtonLink>
          )}
          <Button look="plain" onClick={() => void ask('here')}>
            Sign out
          </Button>
          <Button look="plain" onClick={() => void ask('everywhere')}>
            Sign out on every device
          </Button>
        </div>
      </Disclosure>
      <Dialog open={lost !== null} title="Something is not sent yet" onClose={() => setLost(null)}>
        {lost?.sentences.map((sentence) => (
          <p key={sentence}>{sentence}</p>
        ))}
        <div className="mt-6 flex flex-wrap gap-3">
          <Button onClick={() => setLost(null)}>Stay signed in</Button>
          <Button
            look="danger"
            busy={leave.isPending}
            onClick={() => lost && leave.mutate(lost.where)}
          >
            Sign out all the same
          </Button>
        </div>
      </Dialog>
    </>
  );
}

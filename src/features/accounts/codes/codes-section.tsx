import { useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import type { Account } from '#shared/contracts/accounts.ts';
import { routes } from '#shared/contracts/routes.ts';
import { accountQuery, meQuery, sessionsQuery } from '#src/api/accounts.queries.ts';
import { call } from '#src/api/client.ts';
import { Button } from '#src/ui/button.tsx';
import { dayOf } from '#src/ui/days.ts';
import { Caution } from '#src/ui/states.tsx';
import { useStatus } from '#src/ui/status.tsx';
import { ProveDialog } from './prove-dialog.tsx';
import { RecoveryCodes } from './recovery-codes.tsx';
import { SetUpCodes } from './set-up-codes.tsx';

/** Below this many the page asks for new ones. */
const FEW = 3;

/** Everything about one's own one-time codes. What was begun here stays, whatever the account says meanwhile. */
export function CodesSection({ codes }: { codes: Account['codes'] }) {
  const [settingUp, setSettingUp] = useState(false);
  const client = useQueryClient();
  const say = useStatus();
  const refresh = () =>
    Promise.all(
      [accountQuery, sessionsQuery, meQuery].map(({ queryKey }) =>
        client.invalidateQueries({ queryKey }),
      ),
    );
  if (settingUp)
    return (
      <SetUpCodes
        onOn={() => {
          void refresh();
          say('One-time codes are on. You are signed out everywhere else.');
        }}
        onDone={() => setSettingUp(false)}
        onDrop={() => setSettingUp(false)}
      />
    );
  if (codes.since !== null)
    return <On since={codes.since} left={codes.recoveryLeft} refresh={refresh} />;
  return (
    <div className="max-w-lead space-y-4">
      <p>
        Off. With them, nobody signs in with your password alone: they would need your phone too.
      </p>
      <Button onClick={() => setSettingUp(true)}>Set up one-time codes</Button>
    </div>
  );
}

function On({
  since,
  left,
  refresh,
}: {
  since: string;
  left: number;
  refresh: () => Promise<unknown>;
}) {
  const [asks, setAsks] = useState<'renew' | 'stop' | null>(null);
  const [fresh, setFresh] = useState<readonly string[] | null>(null);
  const say = useStatus();
  if (fresh) return <RecoveryCodes codes={fresh} onDone={() => setFresh(null)} />;
  const close = () => setAsks(null);
  return (
    <div className="max-w-lead space-y-4">
      <p>
        On since {dayOf(since)}. Unused recovery codes: <b>{left}</b>
      </p>
      {left < FEW && (
        <Caution>
          {left === 0 ? 'No recovery code is left.' : 'Few recovery codes are left.'} Make new ones
          before your phone is lost.
        </Caution>
      )}
      <div className="flex flex-wrap gap-3">
        <Button onClick={() => setAsks('renew')}>Make new recovery codes</Button>
        <Button look="danger" onClick={() => setAsks('stop')}>
          Turn off one-time codes
        </Button>
      </div>
      {asks === 'renew' && (
        <ProveDialog
          title="New recovery codes?"
          confirm="Make new ones"
          onClose={close}
          onProven={async (body) => {
            const { recoveryCodes } = await call(routes.renewRecoveryCodes, { body });
            close();
            setFresh(recoveryCodes);
            void refresh();
          }}
        >
          <p>The ones that you kept before then open nothing.</p>
        </ProveDialog>
      )}
      {asks === 'stop' && (
        <ProveDialog
          title="Turn off one-time codes?"
          confirm="Turn them off"
          look="danger"
          onClose={close}
          onProven={async (body) => {
            await call(routes.stopCodes, { body });
            close();
            await refresh();
            say('One-time codes are off. Your password alone signs you in.');
          }}
        >
          <p>Whoever knows your password can then sign in, and your recovery codes open nothing.</p>
        </ProveDialog>
      )}
    </div>
  );
}

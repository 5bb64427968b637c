import { useQuery, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { Link } from 'react-router-dom';
import type { PracticeSettings } from '#shared/contracts/practice.ts';
import { routes } from '#shared/contracts/routes.ts';
import { accountQuery } from '#src/api/accounts.queries.ts';
import { call } from '#src/api/client.ts';
import { practiceQuery } from '#src/api/practice.queries.ts';
import { Button } from '#src/ui/button.tsx';
import { paths } from '#src/ui/paths.ts';
import { ErrorState, Loading } from '#src/ui/states.tsx';
import { useStatus } from '#src/ui/status.tsx';

/** Whether owners need one-time codes. Who has none cannot ask the others for them. */
export function OwnersCode({ settings: { ownersNeedCode } }: { settings: PracticeSettings }) {
  const account = useQuery(accountQuery);
  const client = useQueryClient();
  const say = useStatus();
  const [busy, setBusy] = useState(false);
  const [error, setError] = useState<unknown>(null);
  const set = async (needed: boolean) => {
    setBusy(true);
    setError(null);
    try {
      const answer = await call(routes.setOwnersCode, { body: { needed } });
      client.setQueryData(practiceQuery.queryKey, answer);
      say(needed ? 'Owners now need one-time codes.' : 'Owners choose for themselves now.');
    } catch (problem) {
      setError(problem);
    } finally {
      setBusy(false);
    }
  };
  if (account.isError)
    return <ErrorState error={account.error} onRetry={() => void account.refetch()} />;
  if (!account.data) return <Loading label="Loading your account" />;
  return (
    <div className="max-w-lead space-y-4">
      <p>
        {ownersNeedCode
          ? 'Owners need a one-time code at the sign-in. One who has none sets them up before anything else.'
          : 'Owners choose for themselves whether their sign-in asks for a one-time code.'}
      </p>
      {ownersNeedCode || account.data.codes.since !== null ? (
        <Button busy={busy} onClick={() => void set(!ownersNeedCode)}>
          {ownersNeedCode ? 'Let owners choose' : 'Ask owners for one-time codes'}
        </Button>
      ) : (
        <p>
          To ask all owners for them, first{' '}
          <Link to={`${paths.account()}#codes`}>set them up for your own account</Link>.
        </p>
      )}
      {error !== null && <ErrorState error={error} />}
    </div>
  );
}

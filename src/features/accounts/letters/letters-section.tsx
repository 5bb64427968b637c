import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import type { WaitingMailKind } from '#shared/contracts/waiting-mail.ts';
import { routes } from '#shared/contracts/routes.ts';
import { waitingMailQuery } from '#src/api/waiting-mail.queries.ts';
import { call } from '#src/api/client.ts';
import { Checkbox } from '#src/ui/checkbox.tsx';
import { ErrorState, Loading } from '#src/ui/states.tsx';

const KINDS: Record<WaitingMailKind, string> = {
  'to-review': 'A side waits for my review',
  'sent-back': 'A side of mine was sent back',
  comment: 'Somebody commented on a clip of mine, or answered me',
  'second-marking': 'Somebody asks me for a second marking',
  pain: 'An athlete of mine says that something hurts',
};

/** A letter when something waits, each kind with a switch of its own. */
export function LettersSection() {
  const choices = useQuery(waitingMailQuery);
  const client = useQueryClient();
  const choose = useMutation({
    mutationFn: (body: { kind: WaitingMailKind; on: boolean }) =>
      call(routes.setWaitingMail, { body }),
    onSuccess: (now) => client.setQueryData(waitingMailQuery.queryKey, now),
  });
  if (choices.isError && !choices.data)
    return <ErrorState error={choices.error} onRetry={() => void choices.refetch()} />;
  if (!choices.data) return <Loading label="Loading your letters" />;
  return (
    <>
      {choices.data.items.map(({ kind, on }) => (
        <Checkbox
          key={kind}
          label={KINDS[kind]}
          checked={choose.isPending && choose.variables.kind === kind ? choose.variables.on : on}
          disabled={choose.isPending}
          onChange={(event) => choose.mutate({ kind, on: event.target.checked })}
        />
      ))}
      {choose.isError && <ErrorState error={choose.error} />}
    </>
  );
}

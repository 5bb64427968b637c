import type { QueryClient } from '@tanstack/react-query';
import type { Me } from '#shared/contracts/accounts.ts';
import { meQuery } from '#src/api/accounts.queries.ts';
import { discardAll } from '#src/api/leaving.ts';

/** A session was opened: nothing of another person may be left here; one's own unsent work goes on. */
export function enter(client: QueryClient, me: Me): void {
  if (client.getQueryData(meQuery.queryKey)?.user.id !== me.user.id) discardAll();
  client.clear();
  client.setQueryData(meQuery.queryKey, me);
}

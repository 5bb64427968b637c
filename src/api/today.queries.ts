import { queryOptions } from '@tanstack/react-query';
import { routes } from '#shared/contracts/routes.ts';
import { call } from './client.ts';

/** What waits for the person signed in. */
export const todayQuery = queryOptions({
  queryKey: ['today'],
  queryFn: ({ signal }) => call(routes.today, { signal }),
});

import { queryOptions } from '@tanstack/react-query';
import { routes } from '#shared/contracts/routes.ts';
import { call } from './client.ts';

/** About what the person signed in is written to. */
export const waitingMailQuery = queryOptions({
  queryKey: ['account', 'waiting-mail'],
  queryFn: ({ signal }) => call(routes.waitingMail, { signal }),
});

import { queryOptions } from '@tanstack/react-query';
import { routes } from '#shared/contracts/routes.ts';
import { call } from './client.ts';

/** The people of the practice and the open invitations; for owners. */
export const peopleQuery = queryOptions({
  queryKey: ['people'],
  queryFn: ({ signal }) => call(routes.people, { signal }),
});

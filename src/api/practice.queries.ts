import { queryOptions } from '@tanstack/react-query';
import { routes } from '#shared/contracts/routes.ts';
import { call } from './client.ts';

/** What athletes are told of the practice. */
export const practiceQuery = queryOptions({
  queryKey: ['practice'],
  queryFn: ({ signal }) => call(routes.practice, { signal }),
});

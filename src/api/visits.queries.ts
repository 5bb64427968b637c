import { queryOptions } from '@tanstack/react-query';
import { routes } from '#shared/contracts/routes.ts';
import { call } from './client.ts';

/** One visit with its clips. */
export const visitOptions = (id: string) =>
  queryOptions({
    queryKey: ['visits', id],
    queryFn: ({ signal }) => call(routes.visit, { params: { id }, signal }),
  });

/** The practice's saved ways of filming. */
export const setUpsQuery = queryOptions({
  queryKey: ['set-ups'],
  queryFn: ({ signal }) => call(routes.listSetUps, { signal }),
});

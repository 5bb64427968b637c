import { queryOptions } from '@tanstack/react-query';
import { routes } from '#shared/contracts/routes.ts';
import { call } from './client.ts';

/** The practice's protocol with every version before it. */
export const protocolQuery = queryOptions({
  queryKey: ['protocol'],
  queryFn: ({ signal }) => call(routes.protocol, { signal }),
});

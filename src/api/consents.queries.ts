import { queryOptions } from '@tanstack/react-query';
import { routes } from '#shared/contracts/routes.ts';
import { call } from './client.ts';

/** What the practice reads out when it asks for consent, with every version before it. */
export const consentWordingQuery = queryOptions({
  queryKey: ['consent-wording'],
  queryFn: ({ signal }) => call(routes.consentWording, { signal }),
});

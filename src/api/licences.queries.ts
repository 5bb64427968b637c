import { queryOptions } from '@tanstack/react-query';
import { licencesFile } from '#shared/contracts/licences.ts';
import { call } from './client.ts';

/** The packages that this build was made of; another build is another page. */
export const licencesQuery = queryOptions({
  queryKey: ['licences'],
  queryFn: ({ signal }) => call(licencesFile, { signal }),
  staleTime: Infinity,
});

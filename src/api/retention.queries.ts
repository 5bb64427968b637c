import { keepPreviousData, queryOptions } from '@tanstack/react-query';
import { routes } from '#shared/contracts/routes.ts';
import { call } from './client.ts';

const key = ['retention'] as const;
/** Invalidate it after a change of the term and after an erasure. */
export const retentionKey = key;

/** The practice's term and what was erased; asked again while files are still being deleted. */
export const retentionQuery = queryOptions({
  queryKey: [...key, 'page'],
  queryFn: ({ signal }) => call(routes.retention, { signal }),
  refetchInterval: ({ state }) =>
    state.data?.erasures.some(({ doneAt }) => doneAt === null) ? 3000 : false,
});

/** @param keepMonths 0 for no term */
export const previewOptions = (keepMonths: number, until: string) =>
  queryOptions({
    queryKey: [...key, 'preview', keepMonths, until],
    queryFn: ({ signal }) =>
      call(routes.previewRetention, { query: { keepMonths, until }, signal }),
    placeholderData: keepPreviousData,
  });

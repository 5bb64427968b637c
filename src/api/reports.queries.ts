import { queryOptions } from '@tanstack/react-query';
import { routes } from '#shared/contracts/routes.ts';
import { call } from './client.ts';

/** The reports of a visit, newest first. */
export const reportsOptions = (visitId: string) =>
  queryOptions({
    queryKey: ['reports', visitId],
    queryFn: ({ signal }) => call(routes.listReports, { params: { id: visitId }, signal }),
  });

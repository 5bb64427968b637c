import { keepPreviousData, queryOptions } from '@tanstack/react-query';
import type * as z from 'zod';
import type { auditQuery } from '#shared/contracts/audit.ts';
import { routes } from '#shared/contracts/routes.ts';
import { call } from './client.ts';

export type AuditQuery = z.input<typeof auditQuery>;

export const auditOptions = (query: AuditQuery) =>
  queryOptions({
    queryKey: ['audit', 'list', query],
    queryFn: ({ signal }) => call(routes.audit, { query, signal }),
    // the old page stays while the next one comes
    placeholderData: keepPreviousData,
  });

export const auditNamesQuery = queryOptions({
  queryKey: ['audit', 'names'],
  queryFn: ({ signal }) => call(routes.auditNames, { signal }),
});

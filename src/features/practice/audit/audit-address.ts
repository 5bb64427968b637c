import * as z from 'zod';
import { auditQuery } from '#shared/contracts/audit.ts';
import type { AuditQuery } from '#src/api/audit.queries.ts';

/** Days in the address are days here; the server is asked for moments. */
const day = z.iso.date();
const { person, athlete, action, page } = auditQuery.shape;
const FIELDS = { person, athlete, action, from: day, to: day, page } as const;
export type AuditField = keyof typeof FIELDS;

/** Midnight here at which a day begins, or so many days later. */
const beginOf = (of: string, later = 0): string => {
  const [year = 0, month = 1, date = 1] = of.split('-').map(Number);
  return new Date(year, month - 1, date + later).toISOString();
};

/** The trail's query from the page's address. What the address has wrong is left out, field by field. */
export function queryOf(search: URLSearchParams): AuditQuery {
  const given = (field: AuditField): string | undefined => {
    const value = search.get(field);
    return value !== null && FIELDS[field].safeParse(value).success ? value : undefined;
  };
  const from = given('from');
  const to = given('to');
  const entries = {
    person: given('person'),
    athlete: given('athlete'),
    action: given('action'),
    from: from && beginOf(from),
    // the last day itself counts
    to: to && beginOf(to, 1),
    page: given('page'),
  };
  return Object.fromEntries(Object.entries(entries).filter(([, value]) => value !== undefined));
}

/** The address after one change: an empty value is left out, and any change but of the page starts at page 1. */
export function changed(
  search: URLSearchParams,
  field: AuditField,
  value: string,
): URLSearchParams {
  const next = new URLSearchParams(search);
  if (value === '') next.delete(field);
  else next.set(field, value);
  if (field !== 'page' || value === '1') next.delete('page');
  return next;
}

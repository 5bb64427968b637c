import { athleteListQuery } from '#shared/contracts/athletes.ts';
import type { AthleteListQuery } from '#src/api/athletes.queries.ts';

const FIELDS = ['q', 'consent', 'coach', 'sort', 'page'] as const;
export type ListField = (typeof FIELDS)[number];

/** The list's query from the page's address. What the address has wrong is left out, field by field. */
export function queryOf(search: URLSearchParams): AthleteListQuery {
  const { shape } = athleteListQuery;
  const entries = FIELDS.flatMap((field) => {
    const value = search.get(field);
    return value !== null && shape[field].safeParse(value).success ? [[field, value]] : [];
  });
  return Object.fromEntries(entries) as AthleteListQuery;
}

/** The address after one change: an empty value is left out, and any change but of the page starts at page 1. */
export function changed(search: URLSearchParams, field: ListField, value: string): URLSearchParams {
  const next = new URLSearchParams(search);
  if (value === '') next.delete(field);
  else next.set(field, value);
  if (field !== 'page' || value === '1') next.delete('page');
  return next;
}

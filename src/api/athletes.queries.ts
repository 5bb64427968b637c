import { keepPreviousData, queryOptions } from '@tanstack/react-query';
import type * as z from 'zod';
import type { athleteListQuery } from '#shared/contracts/athletes.ts';
import { routes } from '#shared/contracts/routes.ts';
import { call } from './client.ts';
import { isBeingMade, PREPARING_MS } from './readings.queries.ts';

export type AthleteListQuery = z.input<typeof athleteListQuery>;

/** Everything known of athletes; invalidate it after a change to any of them. */
export const athletesKey = ['athletes'] as const;

export const athleteListOptions = (query: AthleteListQuery) =>
  queryOptions({
    queryKey: [...athletesKey, 'list', query],
    queryFn: ({ signal }) => call(routes.listAthletes, { query, signal }),
    // the old page stays while the next one comes
    placeholderData: keepPreviousData,
  });

export const athleteOptions = (id: string) =>
  queryOptions({
    queryKey: [...athletesKey, 'one', id],
    queryFn: ({ signal }) => call(routes.athlete, { params: { id }, signal }),
  });

export const consentsOptions = (athleteId: string) =>
  queryOptions({
    queryKey: [...athletesKey, 'one', athleteId, 'consents'],
    queryFn: ({ signal }) => call(routes.listConsents, { params: { id: athleteId }, signal }),
  });

export const athleteLinksOptions = (athleteId: string) =>
  queryOptions({
    queryKey: [...athletesKey, 'one', athleteId, 'links'],
    queryFn: ({ signal }) => call(routes.listReplays, { query: { athleteId }, signal }),
    refetchInterval: ({ state }) => (state.data?.items.some(isBeingMade) ? PREPARING_MS : false),
  });

export const athleteVisitsOptions = (athleteId: string) =>
  queryOptions({
    queryKey: [...athletesKey, 'one', athleteId, 'visits'],
    queryFn: ({ signal }) => call(routes.listVisits, { params: { id: athleteId }, signal }),
  });

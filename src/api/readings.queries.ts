import { queryOptions } from '@tanstack/react-query';
import type { Side } from '#shared/contracts/primitives.ts';
import type { Replay } from '#shared/contracts/replays.ts';
import { routes } from '#shared/contracts/routes.ts';
import { call } from './client.ts';

/** Everything derived or said about one visit's sides; invalidate it after a call or a change of marks. */
export const sidesKey = (visitId: string) => ['visits', visitId, 'sides'] as const;

/** The reading of one side; answers `call-first` until that side has a call by eye. */
export const sideReadingOptions = (visitId: string, side: Side) =>
  queryOptions({
    queryKey: [...sidesKey(visitId), side, 'reading'],
    queryFn: ({ signal }) => call(routes.sideReading, { params: { id: visitId, side }, signal }),
  });

export const callsOptions = (visitId: string, side: Side) =>
  queryOptions({
    queryKey: [...sidesKey(visitId), side, 'calls'],
    queryFn: ({ signal }) => call(routes.listCalls, { params: { id: visitId, side }, signal }),
  });

/** How often the links are asked for while a film of one is being prepared, ms. */
export const PREPARING_MS = 5000;

/** Something of this link is made just now, and asked after until it is there. */
export const isBeingMade = ({ state, head, film }: Replay): boolean =>
  state === 'live' && (head === 'being-prepared' || film?.state === 'asked');

/** The replay links of a visit. */
export const replaysOptions = (visitId: string) =>
  queryOptions({
    queryKey: ['visits', visitId, 'replays'],
    queryFn: ({ signal }) => call(routes.listReplays, { query: { visitId }, signal }),
    refetchInterval: ({ state }) => (state.data?.items.some(isBeingMade) ? PREPARING_MS : false),
  });

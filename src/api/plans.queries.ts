import { queryOptions } from '@tanstack/react-query';
import type { Side } from '#shared/contracts/primitives.ts';
import { routes } from '#shared/contracts/routes.ts';
import { call } from './client.ts';

/** Every plan, and what plans could start from. */
export const plansKey = ['plans'] as const;

export const planOptions = (id: string) =>
  queryOptions({
    queryKey: [...plansKey, id],
    queryFn: ({ signal }) => call(routes.plan, { params: { id }, signal }),
  });

/** What a plan of one side could start from; answers `call-first` until that side has a call by eye. */
export const planStartOptions = (visitId: string, side: Side) =>
  queryOptions({
    queryKey: [...plansKey, 'of', visitId, side],
    queryFn: ({ signal }) => call(routes.planStart, { params: { id: visitId, side }, signal }),
  });

export const athletePlansOptions = (athleteId: string) =>
  queryOptions({
    queryKey: [...plansKey, 'of-athlete', athleteId],
    queryFn: ({ signal }) => call(routes.listPlans, { params: { id: athleteId }, signal }),
  });

import { queryOptions } from '@tanstack/react-query';
import type { Side } from '#shared/contracts/primitives.ts';
import { routes } from '#shared/contracts/routes.ts';
import { call } from './client.ts';
import { sidesKey } from './readings.queries.ts';

/** What waits for the word of the person signed in. */
export const reviewQueueQuery = queryOptions({
  queryKey: ['reviews'],
  queryFn: ({ signal }) => call(routes.reviewQueue, { signal }),
});

/** Where the review of one side stands. */
export const sideReviewOptions = (visitId: string, side: Side) =>
  queryOptions({
    queryKey: [...sidesKey(visitId), side, 'review'],
    queryFn: ({ signal }) => call(routes.sideReview, { params: { id: visitId, side }, signal }),
  });

/** Calls by eye against readings; changes with either. */
export const eyeAgreementQuery = queryOptions({
  queryKey: ['reviews', 'eyes'],
  queryFn: ({ signal }) => call(routes.eyeAgreement, { signal }),
});

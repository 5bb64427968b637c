import { queryOptions } from '@tanstack/react-query';
import { routes } from '#shared/contracts/routes.ts';
import { call } from './client.ts';

/** A clip with everything that the Bench needs, in one answer. */
export const benchOptions = (clipId: string) =>
  queryOptions({
    queryKey: ['bench', clipId],
    queryFn: ({ signal }) => call(routes.bench, { params: { id: clipId }, signal }),
  });

/** One clip: state, size, exact frame times. */
export const clipOptions = (clipId: string) =>
  queryOptions({
    queryKey: ['clips', clipId],
    queryFn: ({ signal }) => call(routes.clip, { params: { id: clipId }, signal }),
  });

export const commentsOptions = (clipId: string) =>
  queryOptions({
    queryKey: ['clips', clipId, 'comments'],
    queryFn: ({ signal }) => call(routes.listComments, { params: { id: clipId }, signal }),
  });

/** The reps of a clip, in order. */
export const repsOptions = (clipId: string) =>
  queryOptions({
    queryKey: ['clips', clipId, 'reps'],
    queryFn: ({ signal }) => call(routes.listReps, { params: { id: clipId }, signal }),
  });

import { queryOptions } from '@tanstack/react-query';
import { routes } from '#shared/contracts/routes.ts';
import { call } from './client.ts';

/** The box around the head of a clip, and who looked at it. */
export const headOptions = (clipId: string) =>
  queryOptions({
    queryKey: ['clips', clipId, 'head'],
    queryFn: ({ signal }) => call(routes.head, { params: { id: clipId }, signal }),
  });

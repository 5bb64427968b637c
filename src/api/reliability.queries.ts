import { queryOptions } from '@tanstack/react-query';
import { routes } from '#shared/contracts/routes.ts';
import { call } from './client.ts';

/** The second markings of a rep and who may be asked for one. */
export const secondMarkingsOptions = (repId: string) =>
  queryOptions({
    queryKey: ['reps', repId, 'second-markings'],
    queryFn: ({ signal }) => call(routes.listSecondMarkings, { params: { id: repId }, signal }),
  });

/** One second marking; while it is open, for its marker alone. */
export const secondMarkingOptions = (id: string) =>
  queryOptions({
    queryKey: ['second-markings', id],
    queryFn: ({ signal }) => call(routes.secondMarking, { params: { id }, signal }),
  });

/** How well marks, values, readings and calls repeat; changes when a second marking is finished. */
export const reliabilityOptions = () =>
  queryOptions({
    queryKey: ['reliability'],
    queryFn: ({ signal }) => call(routes.reliability, { signal }),
  });

import { queryOptions } from '@tanstack/react-query';
import { routes } from '#shared/contracts/routes.ts';
import { call } from './client.ts';

/** Who is signed in, and in which practice. */
export const meQuery = queryOptions({
  queryKey: ['me'],
  queryFn: ({ signal }) => call(routes.me, { signal }),
  staleTime: 5 * 60_000,
});

/** One's own account. */
export const accountQuery = queryOptions({
  queryKey: ['account'],
  queryFn: ({ signal }) => call(routes.account, { signal }),
});

export const sessionsQuery = queryOptions({
  queryKey: ['sessions'],
  queryFn: ({ signal }) => call(routes.sessions, { signal }),
});

/** What the link of a letter is for; asking does not use it. A dead one stays dead. */
export const mailLinkOptions = (token: string) =>
  queryOptions({
    queryKey: ['mail-link', token],
    queryFn: ({ signal }) => call(routes.lookAtMailLink, { body: { token }, signal }),
    retry: false,
    staleTime: Infinity,
  });

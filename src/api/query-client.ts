import { MutationCache, QueryCache, QueryClient } from '@tanstack/react-query';
import { meQuery } from './accounts.queries.ts';
import { isProblem } from './problem.ts';

/** A connection that comes back, or a server that restarts, is worth asking again; a no is not. */
const worthAgain = (error: unknown) => isProblem(error, 'offline', 'shutting-down');

/**
 * @param onSignInNeeded called when any query or mutation finds that nobody is signed in
 */
export function makeQueryClient(onSignInNeeded: () => void): QueryClient {
  const onError = (error: unknown) => {
    if (isProblem(error, 'sign-in-needed')) onSignInNeeded();
    // the practice has begun to ask for codes: the frame then leads to them
    if (isProblem(error, 'codes-needed'))
      void client.invalidateQueries({ queryKey: meQuery.queryKey });
  };
  const client = new QueryClient({
    queryCache: new QueryCache({ onError }),
    mutationCache: new MutationCache({ onError }),
    defaultOptions: {
      queries: {
        // live events say when something changed; a minute covers what they do not tell
        staleTime: 60_000,
        retry: (failures, error) => failures < 2 && worthAgain(error),
        retryDelay: (failures) => Math.min(1000 * 2 ** failures, 8000),
        // what is not there, or not to be seen, has a page of its own: the nearest error boundary shows it
        throwOnError: (error, query) =>
          query.state.data === undefined && isProblem(error, 'not-found'),
        // browsers are often wrong about being online: ask, and let the call say
        networkMode: 'always',
      },
      // never repeat a write by itself
      mutations: { retry: false, networkMode: 'always' },
    },
  });
  return client;
}

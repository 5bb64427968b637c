import { startThrowaway } from './throwaway.ts';

/**
 * Vitest's global set-up for tests that need PostgreSQL: the cluster that `npm test` has started, or one of its
 * own, so that `npx vitest` works alone. Workers read its address from REDSHANK_TEST_PG (see database.ts).
 */
export default function setup(): (() => void) | undefined {
  if (process.env.REDSHANK_TEST_PG) return undefined;
  const cluster = startThrowaway();
  process.env.REDSHANK_TEST_PG = cluster.adminUrl;
  return () => {
    delete process.env.REDSHANK_TEST_PG;
    cluster.stop();
  };
}

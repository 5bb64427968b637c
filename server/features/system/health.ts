import type * as z from 'zod';
import type { health } from '#shared/contracts/system.ts';
import type { Ground } from '../../main/ground.ts';

/** Asks each part whether it can do its work; a part that does not answer is a part that fails. */
export const checkHealth = async ({
  orm,
  storage,
  workerAlive,
  version,
}: Ground): Promise<z.infer<typeof health>> => {
  const holds = (asked: Promise<unknown>): Promise<boolean> =>
    asked.then(
      (answer) => answer !== false,
      () => false,
    );
  const [database, stored, worker] = await Promise.all([
    holds(orm.em.fork().execute('select 1')),
    holds(storage.healthy()),
    holds(workerAlive()),
  ]);
  return {
    status: database && stored ? 'ok' : 'failing',
    database,
    storage: stored,
    worker,
    version,
  };
};

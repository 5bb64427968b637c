import { MikroORM } from '@mikro-orm/postgresql';
import { ormOptions } from './orm-options.ts';

/**
 * The pool that serves requests, signed in as `redshank_app`. PostgreSQL is not to compile plans to
 * machine code: in a practice of 100,000 clips that took 0.4 s of a statement's 1.1 s.
 */
export const connect = (appUrl: string, poolMax = 10): Promise<MikroORM> =>
  MikroORM.init({
    ...ormOptions(appUrl),
    pool: { min: 0, max: poolMax },
    driverOptions: { connection: { options: '-c jit=off' } },
  });

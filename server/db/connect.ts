import { MikroORM } from '@mikro-orm/postgresql';
import { ormOptions } from './orm-options.ts';

/** The pool that serves requests, signed in as `redshank_app`. */
export const connect = (appUrl: string, poolMax = 10): Promise<MikroORM> =>
  MikroORM.init({ ...ormOptions(appUrl), pool: { min: 0, max: poolMax } });

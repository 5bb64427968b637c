import { Migrator } from '@mikro-orm/migrations';
import { ormOptions } from './server/db/orm-options.ts';

/** For the command line: `npm run orm migration:create` and `npm run orm migration:check`. */
export default {
  ...ormOptions(process.env.DATABASE_OWNER_URL ?? 'postgres://redshank_owner@127.0.0.1/redshank'),
  extensions: [Migrator],
};

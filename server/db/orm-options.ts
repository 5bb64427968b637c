import { defineConfig, type Options } from '@mikro-orm/postgresql';
import { PRACTICE_FILTER } from './columns.ts';
import { entities } from './entities.ts';
import { idAtCreation } from './id-at-creation.ts';

/**
 * What the server and the command line agree on. The tenancy filter has a parameter and no default, so a find,
 * a count or an update outside `inPractice` throws; row-level security stands behind it.
 */
export const ormOptions = (clientUrl: string): Options =>
  defineConfig({
    clientUrl,
    entities,
    discovery: { warnWhenNoEntities: true, requireEntitiesArray: true },
    filters: {
      [PRACTICE_FILTER]: {
        name: PRACTICE_FILTER,
        cond: (args: { practice: string }, _type: string, _em, _options, entityName) =>
          entityName === 'Practice' ? { id: args.practice } : { practiceId: args.practice },
        default: true,
      },
    },
    subscribers: [idAtCreation],
    // foreign keys are written by hand: each carries the practice
    schemaGenerator: { createForeignKeyConstraints: false },
    forceUtcTimezone: true,
    migrations: {
      path: './migrations',
      glob: 'Migration*.ts',
      emit: 'ts',
      snapshotName: '.snapshot',
    },
  });

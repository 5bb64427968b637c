import { type Migration, Migrator } from '@mikro-orm/migrations';
import { type Constructor, MikroORM } from '@mikro-orm/postgresql';
import { Migration20261201122058_tables } from '../../migrations/Migration20261201122058_tables.ts';
import { Migration20261201122100_walls } from '../../migrations/Migration20261201122100_walls.ts';
import { Migration20261201133912_stale_readings } from '../../migrations/Migration20261201133912_stale_readings.ts';
import { Migration20261201155000_job_priority } from '../../migrations/Migration20261201155000_job_priority.ts';
import { Migration20261201160000_clip_trouble } from '../../migrations/Migration20261201160000_clip_trouble.ts';
import { Migration20261201163000_quiet_from } from '../../migrations/Migration20261201163000_quiet_from.ts';
import { Migration20261201170000_second_markings } from '../../migrations/Migration20261201170000_second_markings.ts';
import { Migration20261201173000_two_clips } from '../../migrations/Migration20261201173000_two_clips.ts';
import { Migration20261201181500_filming_lines } from '../../migrations/Migration20261201181500_filming_lines.ts';
import { Migration20261201194000_protocol } from '../../migrations/Migration20261201194000_protocol.ts';
import { Migration20261201235500_heads } from '../../migrations/Migration20261201235500_heads.ts';
import { Migration20261202001000_prepared_seconds } from '../../migrations/Migration20261202001000_prepared_seconds.ts';
import { Migration20261202033000_hidden_copies } from '../../migrations/Migration20261202033000_hidden_copies.ts';
import { Migration20261202034100_audit_trail } from '../../migrations/Migration20261202034100_audit_trail.ts';
import { Migration20261202035900_people } from '../../migrations/Migration20261202035900_people.ts';
import { Migration20261202041200_consent_life } from '../../migrations/Migration20261202041200_consent_life.ts';
import { Migration20261202043400_erasures } from '../../migrations/Migration20261202043400_erasures.ts';
import { Migration20261202071000_reviews } from '../../migrations/Migration20261202071000_reviews.ts';
import { Migration20261202071700_plans } from '../../migrations/Migration20261202071700_plans.ts';
import { Migration20261202081600_waiting_mail } from '../../migrations/Migration20261202081600_waiting_mail.ts';
import { Migration20261202090100_reports } from '../../migrations/Migration20261202090100_reports.ts';
import { Migration20261202231500_pain_letters } from '../../migrations/Migration20261202231500_pain_letters.ts';
import { Migration20261203043000_kept_films } from '../../migrations/Migration20261203043000_kept_films.ts';
import { Migration20261203070500_replay_befores } from '../../migrations/Migration20261203070500_replay_befores.ts';
import { Migration20261203082300_abandoned_uploads } from '../../migrations/Migration20261203082300_abandoned_uploads.ts';
import { ormOptions } from './orm-options.ts';

/** Every migration in order; imported, so that the bundle carries them. */
const migrationsList: { name: string; class: Constructor<Migration> }[] = [
  { name: 'Migration20261201122058_tables', class: Migration20261201122058_tables },
  { name: 'Migration20261201122100_walls', class: Migration20261201122100_walls },
  {
    name: 'Migration20261201133912_stale_readings',
    class: Migration20261201133912_stale_readings,
  },
  {
    name: 'Migration20261201155000_job_priority',
    class: Migration20261201155000_job_priority,
  },
  {
    name: 'Migration20261201160000_clip_trouble',
    class: Migration20261201160000_clip_trouble,
  },
  {
    name: 'Migration20261201163000_quiet_from',
    class: Migration20261201163000_quiet_from,
  },
  {
    name: 'Migration20261201170000_second_markings',
    class: Migration20261201170000_second_markings,
  },
  {
    name: 'Migration20261201173000_two_clips',
    class: Migration20261201173000_two_clips,
  },
  {
    name: 'Migration20261201181500_filming_lines',
    class: Migration20261201181500_filming_lines,
  },
  {
    name: 'Migration20261201194000_protocol',
    class: Migration20261201194000_protocol,
  },
  {
    name: 'Migration20261201235500_heads',
    class: Migration20261201235500_heads,
  },
  {
    name: 'Migration20261202001000_prepared_seconds',
    class: Migration20261202001000_prepared_seconds,
  },
  {
    name: 'Migration20261202033000_hidden_copies',
    class: Migration20261202033000_hidden_copies,
  },
  {
    name: 'Migration20261202034100_audit_trail',
    class: Migration20261202034100_audit_trail,
  },
  {
    name: 'Migration20261202035900_people',
    class: Migration20261202035900_people,
  },
  {
    name: 'Migration20261202041200_consent_life',
    class: Migration20261202041200_consent_life,
  },
  {
    name: 'Migration20261202043400_erasures',
    class: Migration20261202043400_erasures,
  },
  {
    name: 'Migration20261202071000_reviews',
    class: Migration20261202071000_reviews,
  },
  {
    name: 'Migration20261202071700_plans',
    class: Migration20261202071700_plans,
  },
  {
    name: 'Migration20261202081600_waiting_mail',
    class: Migration20261202081600_waiting_mail,
  },
  {
    name: 'Migration20261202090100_reports',
    class: Migration20261202090100_reports,
  },
  {
    name: 'Migration20261202231500_pain_letters',
    class: Migration20261202231500_pain_letters,
  },
  {
    name: 'Migration20261203043000_kept_films',
    class: Migration20261203043000_kept_films,
  },
  {
    name: 'Migration20261203070500_replay_befores',
    class: Migration20261203070500_replay_befores,
  },
  {
    name: 'Migration20261203082300_abandoned_uploads',
    class: Migration20261203082300_abandoned_uploads,
  },
];

/** Any number, the same in every process that may migrate at the same time. */
const MIGRATION_LOCK = 4_600_001;

/**
 * Brings the schema up to date as its owner. One process at a time: the others wait, then find nothing to do.
 * Either all pending migrations are done or none.
 */
export const migrate = async (ownerUrl: string): Promise<void> => {
  const orm = await MikroORM.init({
    ...ormOptions(ownerUrl),
    extensions: [Migrator],
    migrations: { migrationsList, snapshot: false, silent: true },
  });
  try {
    await orm.em.fork().transactional(async (em) => {
      await em.execute('select pg_advisory_xact_lock(?)', [MIGRATION_LOCK]);
      const transaction = em.getTransactionContext<object>();
      await orm.getMigrator().up(transaction ? { transaction } : {});
    });
  } finally {
    await orm.close(true);
  }
};

/**
 * Do the migrations make the tables that the entities describe? Migrates a new database of the throwaway cluster
 * (REDSHANK_TEST_PG) and lets MikroORM compare: exit status 1 where a migration is missing.
 */
import { spawnSync } from 'node:child_process';
import { freshDatabase } from '#tests/support/database.ts';

const database = await freshDatabase();
try {
  const check = spawnSync('npm', ['run', '--silent', 'orm', '--', 'migration:check'], {
    env: { ...process.env, DATABASE_OWNER_URL: database.ownerUrl },
    stdio: 'inherit',
  });
  process.exitCode = check.status ?? 1;
} finally {
  await database.drop();
}

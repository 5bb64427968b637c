import { migrate } from '#server/db/migrate.ts';
import { asAdmin, layGround, urlsOf } from './admin.ts';
import { createDatabase, type TestDatabase } from './new-database.ts';

const TEMPLATE = 'template_app';
/** any number, the same in every worker */
const TEMPLATE_LOCK = 7_246_001;

/** A database of its own, migrated and empty, in some 0.2 s: a copy of a template that the first caller makes. */
export async function freshDatabase(): Promise<TestDatabase> {
  await asAdmin(async (client) => {
    await client.query('select pg_advisory_lock($1)', [TEMPLATE_LOCK]);
    const found = await client.query('select from pg_database where datname = $1', [TEMPLATE]);
    if (found.rowCount === 0) await makeTemplate();
  });
  return createDatabase(TEMPLATE);
}

/** Renamed when done, so that a migration that fails leaves no half-made template for the next test. */
async function makeTemplate(): Promise<void> {
  const making = `${TEMPLATE}_making`;
  await asAdmin(async (client) => {
    await client.query(`drop database if exists ${making} with (force)`);
    await client.query(`create database ${making} owner redshank_owner`);
  });
  await layGround(making);
  await migrate(urlsOf(making).ownerUrl);
  await asAdmin((client) => client.query(`alter database ${making} rename to ${TEMPLATE}`));
}

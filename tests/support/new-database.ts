import { randomBytes } from 'node:crypto';
import { asAdmin, layGround, urlsOf, type DatabaseUrls } from './admin.ts';

export interface TestDatabase extends DatabaseUrls {
  /** cuts the sessions that are left and removes the database */
  drop(): Promise<void>;
}

/** A database without a schema, as a new instance finds it. */
export function emptyDatabase(): Promise<TestDatabase> {
  return createDatabase('template0');
}

/** A copy of the template, which must have no session at this moment. */
export async function createDatabase(template: string): Promise<TestDatabase> {
  const name = `test_${randomBytes(6).toString('hex')}`;
  await asAdmin((client) =>
    client.query(
      `create database ${name} owner redshank_owner template ${template} strategy file_copy`,
    ),
  );
  // rights on the database itself are not copied with a template
  await layGround(name);
  return {
    ...urlsOf(name),
    drop: () =>
      asAdmin(async (client) => {
        await client.query(`drop database if exists ${name} with (force)`);
      }),
  };
}

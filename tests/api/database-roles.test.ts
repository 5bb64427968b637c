import { Client } from 'pg';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { asAdmin } from '#tests/support/admin.ts';
import { emptyDatabase, type TestDatabase } from '#tests/support/new-database.ts';

let database: TestDatabase;
beforeAll(async () => {
  database = await emptyDatabase();
});
afterAll(() => database.drop());

async function as(url: string, sql: string): Promise<unknown[]> {
  const client = new Client({ connectionString: url });
  await client.connect();
  try {
    return (await client.query<Record<string, unknown>>(sql)).rows;
  } finally {
    await client.end();
  }
}

describe('the roles that Redshank signs in with', () => {
  it('has no superuser and none that passes row-level security by', async () => {
    const rows = await asAdmin(
      async (client) =>
        (
          await client.query<{ rolname: string }>(
            `select rolname from pg_roles where rolname like 'redshank%'
             and not (rolsuper or rolbypassrls or rolcreatedb or rolcreaterole or rolreplication)
             order by rolname`,
          )
        ).rows,
    );
    expect(rows.map((row) => row.rolname)).toEqual([
      'redshank_app',
      'redshank_jobs',
      'redshank_owner',
    ]);
  });

  it('lets the owner make tables and the app use only what it is granted', async () => {
    await as(database.ownerUrl, 'create table shelf (id int); insert into shelf values (1)');
    await expect(as(database.appUrl, 'select * from shelf')).rejects.toThrow('permission denied');
    await as(database.ownerUrl, 'grant select on shelf to redshank_app');
    expect(await as(database.appUrl, 'select * from shelf')).toEqual([{ id: 1 }]);
  });

  it('keeps the app and the queue from making tables beside the owner', async () => {
    for (const url of [database.appUrl, database.jobsUrl]) {
      await expect(as(url, 'create table public.stray (id int)')).rejects.toThrow(
        'permission denied for schema public',
      );
    }
    await expect(as(database.appUrl, 'create table pgboss.stray (id int)')).rejects.toThrow(
      'permission denied for schema pgboss',
    );
  });

  it('lets the queue set up its own schema, as it does at each start', async () => {
    await as(
      database.jobsUrl,
      'create schema if not exists pgboss; create table pgboss.probe (id int)',
    );
    expect(await as(database.jobsUrl, 'select count(*)::int as n from pgboss.probe')).toEqual([
      { n: 0 },
    ]);
  });
});

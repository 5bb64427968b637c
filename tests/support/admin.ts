import { readFileSync } from 'node:fs';
import { Client } from 'pg';

const ground = readFileSync(
  new URL('../../docker-free-scripts/postgres/ground.sql', import.meta.url),
  'utf8',
);

/** The addresses of one database, each for one role of the product. */
export interface DatabaseUrls {
  /** redshank_app: serves requests, row-level security holds for it */
  appUrl: string;
  /** redshank_owner: owns the schema and migrates it */
  ownerUrl: string;
  /** redshank_jobs: owns the queue's schema */
  jobsUrl: string;
}

/** The throwaway cluster's address as redshank_admin. */
export function adminUrl(database = 'postgres'): string {
  const given = process.env.REDSHANK_TEST_PG;
  if (!given) {
    throw new Error(
      'REDSHANK_TEST_PG is not set: run through vitest or npm test, which start a cluster',
    );
  }
  const url = new URL(given);
  url.pathname = `/${database}`;
  return url.href;
}

/** Signs in as redshank_admin, does the work, signs out: a template must have no session when it is copied. */
export async function asAdmin<T>(
  work: (client: Client) => Promise<T>,
  database = 'postgres',
): Promise<T> {
  const client = new Client({ connectionString: adminUrl(database) });
  await client.connect();
  try {
    return await work(client);
  } finally {
    await client.end();
  }
}

/** Gives a database what it has before its first migration: schema owners and the roles' rights. May run again. */
export async function layGround(database: string): Promise<void> {
  await asAdmin((client) => client.query(ground), database);
}

export function urlsOf(database: string): DatabaseUrls {
  const as = (role: string) => {
    const url = new URL(adminUrl(database));
    url.username = role;
    return url.href;
  };
  return {
    appUrl: as('redshank_app'),
    ownerUrl: as('redshank_owner'),
    jobsUrl: as('redshank_jobs'),
  };
}

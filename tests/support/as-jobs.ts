import { Client } from 'pg';
import type { Api } from './api.ts';

/** What the role of the jobs reads: the rows that a worker finds at its start, of every practice. */
export const asJobs = async <T extends Record<string, unknown>>(
  api: Api,
  sql: string | undefined,
): Promise<T[]> => {
  const client = new Client({ connectionString: api.ground.config.database.jobs });
  await client.connect();
  try {
    return (await client.query<T>(sql ?? '')).rows;
  } finally {
    await client.end();
  }
};

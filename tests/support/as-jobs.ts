import { Client } from 'pg';
import type { Api } from './api.ts';

/** Work with a connection of the role of the jobs. */
export const withJobs = async <T>(api: Api, work: (client: Client) => Promise<T>): Promise<T> => {
  const client = new Client({ connectionString: api.ground.config.database.jobs });
  await client.connect();
  try {
    return await work(client);
  } finally {
    await client.end();
  }
};

/** What the role of the jobs reads: the rows that a worker finds at its start, of every practice. */
export const asJobs = <T extends Record<string, unknown>>(
  api: Api,
  sql: string | undefined,
): Promise<T[]> => withJobs(api, async (client) => (await client.query<T>(sql ?? '')).rows);

import { randomUUID } from 'node:crypto';
import { Client } from 'pg';
import type PgBoss from 'pg-boss';
import type { AnyJobHandler, Carried } from './job.ts';
import type { Locks } from './locks.ts';

const KILLED = { reason: 'its worker was killed' };

/**
 * Takes up what a killed worker left, at once rather than when its time is over: jobs that the queue believes in
 * work, and rows that say so themselves, wherever nobody holds their lock. One that another worker has just taken
 * and not locked yet is then done twice, which every job bears.
 */
export const queueOrphans = async (
  jobsUrl: string,
  boss: PgBoss,
  locks: Locks,
  handler: AnyJobHandler,
): Promise<void> => {
  const client = new Client({ connectionString: jobsUrl });
  await client.connect();
  try {
    await retryActive(client, boss, locks, handler);
    await queueUnfinished(client, boss, locks, handler);
  } finally {
    await client.end();
  }
};

/** Queues what has fallen due by the rows' own state since the start. */
export const queueDue = async (
  jobsUrl: string,
  boss: PgBoss,
  locks: Locks,
  handler: AnyJobHandler,
): Promise<void> => {
  const client = new Client({ connectionString: jobsUrl });
  await client.connect();
  try {
    await queueUnfinished(client, boss, locks, handler);
  } finally {
    await client.end();
  }
};

const retryActive = async (
  client: Client,
  boss: PgBoss,
  locks: Locks,
  { queue, lockKey }: AnyJobHandler,
): Promise<void> => {
  const { rows } = await client.query<{ id: string; data: Carried }>(
    `select id, data from pgboss.job where name = $1 and state = 'active'`,
    [queue],
  );
  for (const { id, data } of rows) {
    if (await locks.isFree(lockKey(data.payload))) await boss.fail(queue, id, KILLED);
  }
};

/** What the queue will come to by itself keeps its place there: its priority, and when it is due. */
const keysInQueue = async (
  client: Client,
  { queue, lockKey }: AnyJobHandler,
): Promise<ReadonlySet<string>> => {
  const { rows } = await client.query<{ data: Carried }>(
    `select data from pgboss.job where name = $1 and state < 'active'`,
    [queue],
  );
  return new Set(rows.map(({ data }) => lockKey(data.payload)));
};

const queueUnfinished = async (
  client: Client,
  boss: PgBoss,
  locks: Locks,
  handler: AnyJobHandler,
): Promise<void> => {
  const { queue, unfinished, lockKey } = handler;
  if (!unfinished) return;
  const inQueue = await keysInQueue(client, handler);
  const { rows } = await client.query<Record<string, unknown>>(unfinished.sql);
  for (const row of rows) {
    const { practiceId, payload } = unfinished.read(row);
    const key = lockKey(payload);
    if (inQueue.has(key) || !(await locks.isFree(key))) continue;
    await boss.send(queue, { practiceId, payload } satisfies Carried, { id: randomUUID() });
  }
};

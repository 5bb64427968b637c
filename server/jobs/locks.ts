import { Client } from 'pg';

/** Held shared by every worker while it lives, so that a web process can tell whether there is one. */
const WORKER_LOCK = 4_600_002;

/**
 * Advisory locks on a connection of their own: the database lets go of them when the process dies, however it
 * dies. Keys are texts, hashed to 64 bits by the database.
 */
export class Locks {
  readonly #client: Client;

  private constructor(client: Client) {
    this.#client = client;
  }

  /** @param onLost the connection broke, and with it all that was held */
  static async open(url: string, onLost: () => void): Promise<Locks> {
    const client = new Client({ connectionString: url, keepAlive: true });
    client.on('error', onLost);
    await client.connect();
    await client.query('select pg_advisory_lock_shared($1)', [WORKER_LOCK]);
    return new Locks(client);
  }

  /** Runs `work` while holding the key; where somebody else holds it, does nothing and answers 'busy'. */
  async hold(key: string, work: () => Promise<void>): Promise<'done' | 'busy'> {
    const { rows } = await this.#client.query<{ got: boolean }>(
      'select pg_try_advisory_lock(hashtextextended($1, 0)) as got',
      [key],
    );
    if (!rows[0]?.got) return 'busy';
    try {
      await work();
      return 'done';
    } finally {
      await this.#client.query('select pg_advisory_unlock(hashtextextended($1, 0))', [key]);
    }
  }

  /** Whether nobody holds the key at this moment. */
  async isFree(key: string): Promise<boolean> {
    return (await this.hold(key, () => Promise.resolve())) === 'done';
  }

  async close(): Promise<void> {
    await this.#client.end().catch(() => undefined);
  }
}

/** True while at least one worker holds its place. */
export const WORKER_LIVES_SQL = `select exists (
  select from pg_locks where locktype = 'advisory' and objid = ${WORKER_LOCK} and granted
  and database = (select oid from pg_database where datname = current_database())
) as lives`;

import { Client } from 'pg';
import type PgBoss from 'pg-boss';
import type { Logger } from 'pino';
import { OUTBOX_CHANNEL } from './job.ts';

const AT_MOST = 100;
const LOOK_EVERY_MS = 2000;

type Waiting = {
  id: string;
  practice_id: string;
  queue: string;
  payload: Record<string, unknown>;
  priority: number;
  start_after: Date | null;
};

/**
 * Carries committed jobs from the outbox to the queue, under the same id: killed between sending and ticking off,
 * it sends again and the queue takes no second one. Woken by the commit, and every two seconds in any case.
 */
export class Relay {
  readonly #client: Client;
  readonly #boss: PgBoss;
  readonly #log: Logger;
  #timer: NodeJS.Timeout | undefined;
  #running: Promise<void> | null = null;
  #again = false;
  #stopped = false;

  private constructor(client: Client, boss: PgBoss, log: Logger) {
    this.#client = client;
    this.#boss = boss;
    this.#log = log;
  }

  static async start(
    jobsUrl: string,
    boss: PgBoss,
    log: Logger,
    onLost: () => void,
  ): Promise<Relay> {
    const client = new Client({ connectionString: jobsUrl, keepAlive: true });
    const relay = new Relay(client, boss, log);
    client.on('notification', () => {
      relay.wake();
    });
    client.on('error', (error) => {
      if (relay.#stopped) return;
      log.error({ err: error }, 'the connection to the outbox was lost');
      onLost();
    });
    await client.connect();
    await client.query(`listen ${OUTBOX_CHANNEL}`);
    relay.#timer = setInterval(() => {
      relay.wake();
    }, LOOK_EVERY_MS);
    relay.wake();
    return relay;
  }

  /** Looks now; asked while looking, it looks once more afterwards. */
  wake(): void {
    if (this.#stopped) return;
    if (this.#running) {
      this.#again = true;
      return;
    }
    this.#running = this.#carryAll()
      .catch((error: unknown) => {
        if (!this.#stopped)
          this.#log.error({ err: error }, 'jobs could not be carried to the queue');
      })
      .finally(() => {
        this.#running = null;
        if (this.#again) {
          this.#again = false;
          this.wake();
        }
      });
  }

  async #carryAll(): Promise<void> {
    for (;;) {
      const { rows } = await this.#client.query<Waiting>('select * from jobs_to_send($1)', [
        AT_MOST,
      ]);
      for (const { id, practice_id: practiceId, queue, payload, priority, start_after } of rows) {
        const due = start_after ? { startAfter: start_after } : {};
        await this.#boss.send(queue, { practiceId, payload }, { id, priority, ...due });
      }
      if (rows.length > 0) {
        await this.#client.query('select jobs_were_sent($1)', [rows.map((row) => row.id)]);
      }
      if (rows.length < AT_MOST) return;
    }
  }

  async stop(): Promise<void> {
    this.#stopped = true;
    clearInterval(this.#timer);
    await this.#running;
    await this.#client.end().catch(() => undefined);
  }
}

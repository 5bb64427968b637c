import PgBoss from 'pg-boss';
import type { Ground } from '../main/ground.ts';
import type { AnyJobHandler, Carried } from './job.ts';
import { Locks } from './locks.ts';
import { queueDue, queueOrphans } from './orphans.ts';
import { Relay } from './relay.ts';

const BUSY_RETRY_SECONDS = 10;

export interface Worker {
  /** Aborts what runs, waits for it to end, lets go of the database. */
  readonly stop: () => Promise<void>;
}

/** Starts the queue, the relay that feeds it, and one loop per kind of job. */
export const startWorker = async (
  ground: Ground,
  handlers: readonly AnyJobHandler[],
  /** A connection that the worker stands on broke: stop it and start another. */
  onLost: () => void,
): Promise<Worker> => {
  const { log, config } = ground;
  const jobsUrl = config.database.jobs;
  const stopping = new AbortController();

  const boss = new PgBoss({
    connectionString: jobsUrl,
    schema: 'pgboss',
    application_name: 'redshank worker',
    max: 3,
    schedule: false,
    archiveCompletedAfterSeconds: 24 * 3600,
    deleteAfterDays: 7,
  });
  boss.on('error', (error) => {
    log.error({ err: error }, 'the queue reports an error');
  });
  const looks: NodeJS.Timeout[] = [];
  let locks: Locks | null = null;
  let relay: Relay | null = null;
  const stop = async (): Promise<void> => {
    stopping.abort();
    looks.forEach(clearInterval);
    await relay?.stop();
    await boss.stop({ graceful: true, wait: true, timeout: 10_000 });
    await locks?.close();
  };

  const runOne = async (
    held: Locks,
    job: PgBoss.Job<Carried>,
    handler: AnyJobHandler,
  ): Promise<void> => {
    const { practiceId, payload } = job.data;
    const started = Date.now();
    const names = { job: job.id, queue: handler.queue };
    try {
      const outcome = await held.hold(handler.lockKey(payload), () =>
        handler.run({ ground, practiceId, payload, signal: stopping.signal }),
      );
      if (outcome === 'busy') {
        await boss.send(handler.queue, job.data, { startAfter: BUSY_RETRY_SECONDS });
      }
      log.info({ ...names, outcome, ms: Date.now() - started }, 'job done');
    } catch (error) {
      if (!stopping.signal.aborted) log.error({ ...names, err: error }, 'job failed');
      throw error;
    }
  };

  const begin = async (): Promise<void> => {
    await boss.start();
    const held = await Locks.open(jobsUrl, () => {
      if (stopping.signal.aborted) return;
      log.error('the connection that holds the locks was lost; jobs in work are stopped');
      stopping.abort();
      onLost();
    });
    locks = held;
    for (const handler of handlers) {
      await boss.createQueue(handler.queue, {
        name: handler.queue,
        policy: 'standard',
        retryLimit: handler.retryLimit,
        retryDelay: handler.retryDelaySeconds,
        retryBackoff: true,
        expireInMinutes: handler.expireInMinutes,
      });
      await queueOrphans(jobsUrl, boss, held, handler);
    }
    for (const handler of handlers) {
      const minutes = handler.lookAgainMinutes;
      if (minutes === undefined) continue;
      const look = () => {
        queueDue(jobsUrl, boss, held, handler).catch((error: unknown) => {
          if (!stopping.signal.aborted) log.error({ err: error }, 'what is due was not looked for');
        });
      };
      looks.push(setInterval(look, minutes * 60_000));
    }
    relay = await Relay.start(jobsUrl, boss, log, onLost);
    for (const handler of handlers) {
      await boss.work<Carried>(
        handler.queue,
        { batchSize: 1, pollingIntervalSeconds: 0.5 },
        async ([job]) => {
          if (!job) return;
          await runOne(held, job, handler);
        },
      );
    }
  };

  try {
    await begin();
  } catch (error) {
    // the parts that have begun would go on by themselves, with a database that is closed behind them
    await stop().catch(() => undefined);
    throw error;
  }
  return { stop };
};

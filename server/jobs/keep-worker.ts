import { setTimeout as pause } from 'node:timers/promises';
import type { Ground } from '../main/ground.ts';
import type { AnyJobHandler } from './job.ts';
import { startWorker, type Worker } from './worker.ts';

const RESTART_MS = 2000;
/** A queue that cannot be reached so often at the start is no restart of the database but a wrong setting. */
const FIRST_TRIES = 5;

/** A worker that outlives a restart of the database: whenever its connections break, another is started. */
export const keepWorker = async (
  ground: Ground,
  handlers: readonly AnyJobHandler[],
): Promise<Worker> => {
  let current: Worker | null = null;
  let timer: NodeJS.Timeout | undefined;
  let changing: Promise<void> = Promise.resolve();
  let stopped = false;

  const start = async (): Promise<void> => {
    // of one that did not come to its start
    clearTimeout(timer);
    current = await startWorker(ground, handlers, restartSoon);
  };
  const restart = async (): Promise<void> => {
    if (stopped) return;
    await current?.stop().catch(() => undefined);
    current = null;
    await start().catch(() => {
      ground.log.warn('the worker cannot start yet and tries again');
      restartSoon();
    });
  };
  const restartSoon = (): void => {
    if (stopped) return;
    clearTimeout(timer);
    timer = setTimeout(() => {
      changing = changing.then(restart);
    }, RESTART_MS);
  };

  const first = async (left: number): Promise<void> => {
    try {
      await start();
    } catch (error) {
      clearTimeout(timer);
      if (left === 0) throw error;
      ground.log.warn({ err: error }, 'the worker cannot start yet and tries again');
      await pause(RESTART_MS);
      await first(left - 1);
    }
  };

  await first(FIRST_TRIES - 1);
  return {
    stop: async () => {
      stopped = true;
      clearTimeout(timer);
      await changing;
      await current?.stop();
    },
  };
};

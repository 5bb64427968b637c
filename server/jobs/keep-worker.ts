import type { Ground } from '../main/ground.ts';
import type { AnyJobHandler } from './job.ts';
import { startWorker, type Worker } from './worker.ts';

const RESTART_MS = 2000;

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

  await start();
  return {
    stop: async () => {
      stopped = true;
      clearTimeout(timer);
      await changing;
      await current?.stop();
    },
  };
};

import { Client } from 'pg';
import type { Logger } from 'pino';
import { EVENT_CHANNEL, type ToldEvent } from './tell.ts';

const RETRY_MS = 1000;

/**
 * Listens for events on a connection of its own, which a pool would hand to others. A lost connection is opened
 * again; what was told meanwhile is lost to this process, so `onGap` lets the tabs ask anew.
 * @returns stops listening
 */
export const listenForEvents = async (options: {
  readonly url: string;
  readonly log: Logger;
  readonly onEvent: (event: ToldEvent) => void;
  readonly onGap: () => void;
}): Promise<() => Promise<void>> => {
  const { url, log, onEvent, onGap } = options;
  let stopped = false;
  let client: Client | undefined;
  let timer: NodeJS.Timeout | undefined;

  const open = async (): Promise<void> => {
    const opened = new Client({ connectionString: url, keepAlive: true });
    client = opened;
    let listening = false;
    opened.on('notification', ({ payload }) => {
      if (payload) onEvent(JSON.parse(payload) as ToldEvent);
    });
    opened.on('error', () => undefined);
    opened.on('end', () => {
      // one that never came to listen ends too: whoever opened it tries again, or each failure would count twice
      if (listening) reopen();
    });
    try {
      await opened.connect();
      await opened.query(`listen ${EVENT_CHANNEL}`);
      listening = true;
    } catch (error) {
      void opened.end().catch(() => undefined);
      throw error;
    }
    if (stopped) await opened.end();
  };
  const reopen = (): void => {
    if (stopped) return;
    log.warn('the connection for live events was lost and is opened again');
    timer = setTimeout(() => {
      open().then(onGap, reopen);
    }, RETRY_MS);
  };

  await open();
  return async () => {
    stopped = true;
    clearTimeout(timer);
    await client?.end().catch(() => undefined);
  };
};

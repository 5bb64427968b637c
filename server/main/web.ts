import type { Server } from 'node:http';
import { join } from 'node:path';
import { listenForEvents } from '../events/listen.ts';
import { makeApp } from '../http/app.ts';
import { makeHttpServer } from '../http/http-server.ts';
import { features } from './features.ts';
import type { Ground } from './ground.ts';
import { repoRoot } from './root.ts';

/** Requests under way get this long to end when the server stops. */
const GRACE_MS = 5000;

export interface Web {
  readonly stop: () => Promise<void>;
}

const listen = (server: Server, port: number, host: string): Promise<void> =>
  new Promise((resolve, reject) => {
    server.once('error', reject);
    server.listen(port, host, () => {
      server.off('error', reject);
      resolve();
    });
  });

/** Serves the interface and the pages. */
export const startWeb = async (ground: Ground): Promise<Web> => {
  const { config, events, log } = ground;
  let closing = false;
  const stopListening = await listenForEvents({
    url: config.database.app,
    log,
    onEvent: (event) => {
      events.publish(event);
    },
    onGap: () => {
      events.closeAll();
    },
  });
  const app = makeApp(ground, {
    features,
    pages: join(repoRoot(), 'dist', 'web'),
    isClosing: () => closing,
  });
  const server = makeHttpServer(app);
  await listen(server, config.port, config.host).catch(async (error: unknown) => {
    await stopListening();
    throw error;
  });

  return {
    stop: async () => {
      closing = true;
      const closed = new Promise<void>((resolve) => {
        server.close(() => {
          resolve();
        });
      });
      events.closeAll();
      server.closeIdleConnections();
      const cut = setTimeout(() => {
        server.closeAllConnections();
      }, GRACE_MS);
      await closed;
      clearTimeout(cut);
      await stopListening();
    },
  };
};

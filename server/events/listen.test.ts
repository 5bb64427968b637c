import { type AddressInfo, connect, createServer, type Server, type Socket } from 'node:net';
import { pino } from 'pino';
import { afterAll, beforeAll, expect, it, vi } from 'vitest';
import { type Api, startApi } from '#tests/support/api.ts';
import { listenForEvents } from './listen.ts';

let api: Api;
/** Stands before the database, and lets nobody through while it is away. */
let door: Server;
let url: URL;
let away = false;
let arrivals: number[] = [];
const through = new Set<Socket>();
beforeAll(async () => {
  api = await startApi();
  url = new URL(api.ground.config.database.app);
  const { hostname, port } = new URL(url);
  door = createServer((socket) => {
    arrivals.push(performance.now());
    if (away) {
      socket.destroy();
      return;
    }
    const onwards = connect(Number(port), hostname);
    for (const [from, to] of [
      [socket, onwards],
      [onwards, socket],
    ] as const) {
      through.add(from);
      from.pipe(to);
      from.on('error', () => to.destroy());
      from.on('close', () => {
        through.delete(from);
        to.destroy();
      });
    }
  });
  await new Promise<void>((resolve) => {
    door.listen(0, '127.0.0.1', resolve);
  });
  url.hostname = '127.0.0.1';
  url.port = String((door.address() as AddressInfo).port);
});
afterAll(async () => {
  door.close();
  await api.close();
});

it('knocks once at a time while the database is away, and comes back on one connection', async () => {
  const onGap = vi.fn();
  const log = pino({ level: 'silent' });
  const stop = await listenForEvents({ url: url.href, log, onEvent: () => undefined, onGap });
  try {
    expect(arrivals).toHaveLength(1);
    arrivals = [];
    away = true;
    for (const socket of through) socket.destroy();
    await vi.waitFor(() => expect(arrivals.length).toBeGreaterThan(3), { timeout: 15_000 });
    const gaps = arrivals.slice(1).map((at, n) => at - (arrivals[n] ?? 0));
    // two that knock together were two of a growing number
    expect(Math.min(...gaps)).toBeGreaterThan(500);
    expect(onGap).not.toHaveBeenCalled();
    away = false;
    await vi.waitFor(() => expect(onGap).toHaveBeenCalledOnce(), { timeout: 15_000 });
    expect(through.size).toBe(2);
  } finally {
    await stop();
  }
  await vi.waitFor(() => expect(through.size).toBe(0));
});

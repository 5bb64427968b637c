import { readdir } from 'node:fs/promises';
import type { Server } from 'node:http';
import { type AddressInfo, connect, type Socket } from 'node:net';
import { setTimeout as pause } from 'node:timers/promises';
import { afterAll, afterEach, beforeAll, describe, expect, it, vi } from 'vitest';
import { Session } from '#server/features/accounts/session.entity.ts';
import { makeHttpServer, type Patience } from '#server/http/http-server.ts';
import { type Api, startApi } from '#tests/support/api.ts';

const SHORT: Patience = { idleMs: 400, headersMs: 300, lookEveryMs: 50 };

let api: Api;
let server: Server;
beforeAll(async () => {
  api = await startApi();
});
afterEach(() => {
  vi.useRealTimers();
  server.closeAllConnections();
  server.close();
});
afterAll(() => api.close());

const serving = async (patience?: Patience): Promise<void> => {
  server = makeHttpServer(api.app, patience);
  await new Promise<void>((resolve) => {
    server.listen(0, '127.0.0.1', resolve);
  });
};
const knock = (): Socket => connect((server.address() as AddressInfo).port, '127.0.0.1');

/** All that was answered, once the connection is over. */
const ended = (socket: Socket): Promise<string> =>
  new Promise((resolve) => {
    let said = '';
    socket.on('data', (bytes) => (said += bytes.toString()));
    socket.on('error', () => undefined);
    socket.once('close', () => {
      resolve(said);
    });
  });

/** Sends one byte of it after the other, for as long as somebody listens. */
const trickle = (socket: Socket, byte = 'a'): void => {
  const timer = setInterval(() => {
    if (socket.writable) socket.write(byte);
    else clearInterval(timer);
  }, 20);
  socket.once('close', () => {
    clearInterval(timer);
  });
};

const head = async (path: string, more: readonly string[]): Promise<string> => {
  const session = await api.ground.inPractice(api.world.coach, ({ em }) =>
    Promise.resolve(
      em.create(Session, {
        user: api.world.coach.id,
        device: 'A test',
        expiresAt: new Date(Date.now() + 86_400_000),
      }),
    ),
  );
  const cookie = api.ground.sessions.cookieFor(session.id).split(';')[0] ?? '';
  return [
    `POST ${path} HTTP/1.1`,
    'Host: redshank.test',
    `Cookie: ${cookie}`,
    ...more,
    '',
    '',
  ].join('\r\n');
};

describe('who sends a byte at a time', () => {
  it('is heard for twenty seconds of headers, and for a minute of silence', async () => {
    await serving();
    expect(server.headersTimeout).toBe(20_000);
    expect(server.timeout).toBe(60_000);
  });

  it('is cut in the headers', async () => {
    await serving(SHORT);
    const socket = knock();
    socket.write('GET /api/health HTTP/1.1\r\nHost: redshank.test\r\nX-Long: ');
    trickle(socket);
    expect(await ended(socket)).toMatch(/^HTTP\/1\.1 408 /);
  });

  it.each(['/api/sign-in', '/api/forgot', `/api/r/${'a'.repeat(43)}/unlock`])(
    'is cut in the body that nobody signed in sends to %s',
    async (path) => {
      await serving();
      vi.useFakeTimers({ toFake: ['setTimeout', 'clearTimeout'] });
      const reached = new Promise<void>((resolve) => server.once('request', () => resolve()));
      const socket = knock();
      socket.write(
        `POST ${path} HTTP/1.1\r\nHost: redshank.test\r\nContent-Type: application/json\r\nContent-Length: 9000\r\n\r\n{"email":"`,
      );
      trickle(socket);
      await reached;
      const over = ended(socket);
      let cut = false;
      void over.then(() => (cut = true));
      await vi.advanceTimersByTimeAsync(29_000);
      expect(cut).toBe(false);
      await vi.advanceTimersByTimeAsync(1000);
      expect(await over).toBe('');
    },
  );
});

describe('an upload', () => {
  const BOUNDARY = 'edge';
  const opening = [
    `--${BOUNDARY}`,
    'Content-Disposition: form-data; name="view"',
    '',
    'front',
    `--${BOUNDARY}`,
    'Content-Disposition: form-data; name="clip"; filename="a.mp4"',
    'Content-Type: video/mp4',
    '',
    '',
  ].join('\r\n');
  const closing = `\r\n--${BOUNDARY}--\r\n`;
  const start = async (bytes: number): Promise<Socket> => {
    const path = `/api/visits/${api.world.visit.id}/clips`;
    const socket = knock();
    socket.write(
      await head(path, [
        `Content-Type: multipart/form-data; boundary=${BOUNDARY}`,
        `Content-Length: ${opening.length + bytes + closing.length}`,
        'Connection: close',
      ]),
    );
    socket.write(opening);
    return socket;
  };
  const incoming = () => readdir(api.ground.storage.incoming);

  it('that falls silent is cut, and leaves nothing', async () => {
    await serving(SHORT);
    const socket = await start(1_000_000);
    socket.write('x'.repeat(1000));
    await ended(socket);
    await expect.poll(incoming, { timeout: 10_000 }).toEqual([]);
  });

  it('that moves is waited for, longer than headers are', async () => {
    await serving({ ...SHORT, idleMs: 20_000 });
    const pieces = 12;
    const socket = await start(pieces);
    const over = ended(socket);
    for (let n = 0; n < pieces; n += 1) {
      socket.write('x');
      await pause(50);
    }
    socket.write(closing);
    expect(await over).toMatch(/^HTTP\/1\.1 201 /);
  });
});

import type { AddressInfo } from 'node:net';
import type { User } from '#server/features/accounts/user.entity.ts';
import { Session } from '#server/features/accounts/session.entity.ts';
import { type Api, startApi } from '#tests/support/api.ts';

/** The interface behind a real socket, as the product runs it. */
export interface Served {
  readonly api: Api;
  /** Asks as the coach of the test world. */
  readonly ask: (path: string, init?: RequestInit) => Promise<unknown>;
  /** The same as somebody else. */
  readonly asking: (user: User) => Promise<Served['ask']>;
  readonly stop: () => Promise<void>;
}

const cookieOf = async (api: Api, user: User): Promise<string> => {
  const session = await api.ground.inPractice(user, ({ em }) =>
    Promise.resolve(
      em.create(Session, {
        user: user.id,
        device: 'A measurement',
        expiresAt: new Date(Date.now() + 86_400_000),
      }),
    ),
  );
  return api.ground.sessions.cookieFor(session.id).split(';')[0] ?? '';
};

export const serve = async (): Promise<Served> => {
  // answers are checked against their contracts in tests only
  const api = await startApi({ NODE_ENV: 'production' });
  const server = api.app.listen(0, '127.0.0.1');
  await new Promise((resolve) => server.once('listening', resolve));
  const { port } = server.address() as AddressInfo;
  const asking = async (user: User) => {
    const cookie = await cookieOf(api, user);
    return async (path: string, init: RequestInit = {}): Promise<unknown> => {
      const answer = await fetch(`http://127.0.0.1:${port}${path}`, {
        ...init,
        headers: { cookie, 'content-type': 'application/json' },
      });
      if (!answer.ok) throw new Error(`${path} answered ${answer.status}`);
      return answer.json();
    };
  };
  return {
    api,
    asking,
    ask: await asking(api.world.coach),
    stop: async () => {
      await new Promise((resolve) => server.close(resolve));
      await api.close();
    },
  };
};

/** Milliseconds that `work` takes. */
export const timed = async (work: () => Promise<unknown>): Promise<number> => {
  const before = performance.now();
  await work();
  return performance.now() - before;
};

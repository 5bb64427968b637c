import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { Express } from 'express';
import supertest from 'supertest';
import { connect } from '#server/db/connect.ts';
import { makeInPractice } from '#server/db/in-practice.ts';
import { EventHub } from '#server/events/event-hub.ts';
import { listenForEvents } from '#server/events/listen.ts';
import { Session } from '#server/features/accounts/session.entity.ts';
import type { User } from '#server/features/accounts/user.entity.ts';
import { makeApp } from '#server/http/app.ts';
import { makeLog } from '#server/http/logging.ts';
import { keepSessions } from '#server/http/session.ts';
import type { Mail } from '#server/mail/mailer.ts';
import { readConfig } from '#server/main/config.ts';
import { features } from '#server/main/features.ts';
import type { Ground } from '#server/main/ground.ts';
import { sealWith } from '#server/main/sealer.ts';
import { LocalStorage } from '#server/storage/local-storage.ts';
import { freshDatabase } from './database.ts';
import { makeWorld, type World } from './world.ts';

/** The whole interface over a database, a folder and a mailbox of its own. */
export interface Api {
  readonly app: Express;
  readonly ground: Ground;
  /** What was mailed, oldest first. */
  readonly mailbox: readonly Mail[];
  /** Requests without a session. */
  readonly nobody: ReturnType<typeof supertest>;
  /** Requests with an open session of this user; to another app over the same ground where one is given. */
  readonly as: (user: User, to?: Express) => Promise<ReturnType<typeof supertest.agent>>;
  /** Two practices with their people, see world.ts. */
  readonly world: World;
  readonly close: () => Promise<void>;
}

/** @param env settings beside those that a test needs */
export const startApi = async (env: NodeJS.ProcessEnv = {}): Promise<Api> => {
  const database = await freshDatabase();
  const folder = await mkdtemp(join(tmpdir(), 'redshank-api-'));
  const config = readConfig({
    NODE_ENV: 'test',
    PUBLIC_URL: 'http://redshank.test',
    REDSHANK_DATA: folder,
    REDSHANK_LOG: process.env.REDSHANK_LOG ?? 'silent',
    DATABASE_URL: database.appUrl,
    DATABASE_OWNER_URL: database.ownerUrl,
    DATABASE_JOBS_URL: database.jobsUrl,
    ...env,
  });
  const orm = await connect(database.appUrl);
  const mailbox: Mail[] = [];
  const events = new EventHub();
  const log = makeLog(config.logLevel);
  const stopListening = await listenForEvents({
    url: database.appUrl,
    log,
    onEvent: (event) => {
      events.publish(event);
    },
    onGap: () => {
      events.closeAll();
    },
  });
  const ground: Ground = {
    config,
    log,
    orm,
    inPractice: makeInPractice(orm),
    sessions: keepSessions({ db: () => orm.em.fork(), key: 'a key for tests', secure: false }),
    sealer: sealWith('a key for tests'),
    storage: await LocalStorage.open(config.uploads),
    mail: {
      send: (mail) => {
        mailbox.push(mail);
        return Promise.resolve();
      },
      close: () => undefined,
    },
    events,
    workerAlive: () => Promise.resolve(true),
    version: 'test',
  };
  const app = makeApp(ground, { features });

  const as = async (user: User, to = app): Promise<ReturnType<typeof supertest.agent>> => {
    const session = await ground.inPractice(user, ({ em }) =>
      Promise.resolve(
        em.create(Session, {
          user: user.id,
          device: 'A test',
          expiresAt: new Date(Date.now() + 86_400_000),
        }),
      ),
    );
    const cookie = ground.sessions.cookieFor(session.id).split(';')[0] ?? '';
    return supertest.agent(to).set('Cookie', cookie);
  };

  return {
    app,
    ground,
    mailbox,
    nobody: supertest(app),
    as,
    world: await makeWorld(ground.inPractice),
    close: async () => {
      events.closeAll();
      await stopListening();
      await orm.close(true);
      await database.drop();
      await rm(folder, { recursive: true, force: true });
    },
  };
};

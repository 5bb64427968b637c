import { readFile } from 'node:fs/promises';
import { join } from 'node:path';
import type { Logger } from 'pino';
import { connect } from '../db/connect.ts';
import { makeInPractice } from '../db/in-practice.ts';
import { EventHub } from '../events/event-hub.ts';
import { cookieIsSecure } from '../http/cookie-is-secure.ts';
import { keepSessions } from '../http/session.ts';
import { WORKER_LIVES_SQL } from '../jobs/locks.ts';
import { openMailer } from '../mail/open-mailer.ts';
import { openStorage } from '../storage/open-storage.ts';
import type { Config } from './config.ts';
import type { Ground } from './ground.ts';
import { repoRoot } from './root.ts';
import { sealWith } from './sealer.ts';
import { SecretFile } from './secrets.ts';

const readVersion = async (): Promise<string> => {
  const { version } = JSON.parse(await readFile(join(repoRoot(), 'package.json'), 'utf8')) as {
    version: string;
  };
  return version;
};

/** Opens everything that the features stand on. */
export const makeGround = async (config: Config, log: Logger): Promise<Ground> => {
  const orm = await connect(config.database.app);
  const db = () => orm.em.fork();
  return {
    config,
    log,
    orm,
    inPractice: makeInPractice(orm),
    sessions: keepSessions({
      db,
      key: await new SecretFile(config.secrets, 'session-key').readOrMake(32),
      secure: cookieIsSecure(config.publicUrl),
    }),
    sealer: sealWith(await new SecretFile(config.secrets, 'sealing-key').readOrMake(32)),
    storage: await openStorage(config),
    mail: openMailer(config),
    events: new EventHub(),
    workerAlive: async () => {
      const [row] = await db().execute<{ lives: boolean }[]>(WORKER_LIVES_SQL);
      return row?.lives === true;
    },
    version: await readVersion(),
  };
};

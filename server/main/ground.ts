import type { MikroORM } from '@mikro-orm/postgresql';
import type { Logger } from 'pino';
import type { InPractice } from '../db/in-practice.ts';
import type { EventHub } from '../events/event-hub.ts';
import type { SessionKeeper } from '../http/session.ts';
import type { Mailer } from '../mail/mailer.ts';
import type { Storage } from '../storage/storage.ts';
import type { Config } from './config.ts';
import type { Sealer } from './sealer.ts';

/** What every feature stands on. Made once at the start, or once per test file. */
export interface Ground {
  readonly config: Config;
  readonly log: Logger;
  readonly orm: MikroORM;
  readonly inPractice: InPractice;
  readonly sessions: SessionKeeper;
  /** Seals what is kept and must be read again, under a key that is not in the database. */
  readonly sealer: Sealer;
  readonly storage: Storage;
  readonly mail: Mailer;
  readonly events: EventHub;
  /** Whether a worker is known to be at work. */
  readonly workerAlive: () => Promise<boolean>;
  readonly version: string;
}

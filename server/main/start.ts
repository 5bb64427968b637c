import { seedDemo } from '../db/demo/seed-demo.ts';
import { migrate } from '../db/migrate.ts';
import { makeLog } from '../http/logging.ts';
import { keepWorker } from '../jobs/keep-worker.ts';
import { inboxIsFor, openInbox } from '../mail/inbox.ts';
import { type Config, ConfigError, readConfig } from './config.ts';
import { jobs } from './jobs.ts';
import { makeGround } from './make-ground.ts';
import { SecretFile } from './secrets.ts';
import { explainStartError } from './start-errors.ts';
import { startWeb } from './web.ts';

type Part = 'web' | 'worker';

/** `--only web` or `--only worker`; both in one process otherwise. */
const partsOf = (args: readonly string[]): readonly Part[] => {
  const at = args.indexOf('--only');
  if (at === -1) return ['web', 'worker'];
  const part = args[at + 1];
  if (part === 'web' || part === 'worker') return [part];
  throw new ConfigError('Say --only web or --only worker, or leave it out to run both.');
};

const say = (line: string): void => {
  process.stdout.write(`${line}\n`);
};

/** Resolves at the first SIGINT or SIGTERM; a second one is heard by nobody, so it ends the process at once. */
const stopAsked = (): Promise<void> =>
  new Promise((resolve) => {
    for (const signal of ['SIGINT', 'SIGTERM'] as const) process.once(signal, () => resolve());
  });

const run = async (config: Config, parts: readonly Part[]): Promise<void> => {
  const asked = stopAsked();
  const log = makeLog(config.logLevel);
  await migrate(config.database.owner);
  const ground = await makeGround(config, log);
  const stops: (() => Promise<void>)[] = [
    async () => {
      ground.mail.close();
      await ground.orm.close();
    },
  ];
  try {
    const demo = await seedDemo(ground);
    if (parts.includes('worker')) stops.push((await keepWorker(ground, jobs)).stop);
    if (parts.includes('web')) {
      stops.push((await startWeb(ground)).stop);
      say(`\nRedshank serves ${config.publicUrl}`);
      if (inboxIsFor(config)) {
        const secret = await new SecretFile(config.secrets, 'inbox-address').readOrMake(16);
        const inbox = await openInbox(config, secret);
        stops.push(inbox.close);
        say(`No mail server is set: letters are kept, and read at ${inbox.url}`);
      }
      if (demo) demo.lines.forEach(say);
    } else say('Redshank’s worker is at work.');
    await asked;
  } finally {
    for (const stop of stops.reverse()) await stop();
  }
};

try {
  await run(readConfig(process.env), partsOf(process.argv.slice(2)));
} catch (error) {
  process.stderr.write(`${explainStartError(error)}\n`);
  process.exitCode = 1;
}

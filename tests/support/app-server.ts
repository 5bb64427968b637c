/**
 * Runs the built app (dist/server/main.js) for a browser run: own database, data folder, port and mailbox, demo
 * seeded. `node --import tsx tests/support/app-server.ts PID` writes tests/.out/app.json once the app answers, and
 * ends, leaving nothing, on SIGTERM or when process PID has ended.
 */
import { execFileSync, spawn, type ChildProcess } from 'node:child_process';
import { randomBytes } from 'node:crypto';
import { once } from 'node:events';
import { mkdirSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';
import { clearState, writeState } from './app-state.ts';
import { catchMail } from './mail-catcher.ts';
import { emptyDatabase } from './new-database.ts';
import { startThrowaway } from './throwaway.ts';

const root = new URL('../../', import.meta.url);
const watched = Number(process.argv[2]);
const ended = new AbortController();

/** The person's own settings must not decide what the tests see. */
function withoutSettings(env: NodeJS.ProcessEnv): NodeJS.ProcessEnv {
  const setting = /^(REDSHANK_.*|DATABASE_.*|NODE_ENV|TRUST_PROXY|FORCE_COLOR)$/;
  return Object.fromEntries(Object.entries(env).filter(([name]) => !setting.test(name)));
}

async function answers(url: string, app: ChildProcess): Promise<void> {
  for (;;) {
    if (app.exitCode !== null) throw new Error(`the app ended with status ${app.exitCode}`);
    const answer = await fetch(`${url}/api/health`).catch(() => null);
    if (answer?.ok) return;
    await pause(100, undefined, { signal: ended.signal });
  }
}

/** Takes back in reverse order what was set up, however far that came. */
const undo: (() => unknown)[] = [];
async function tidyUp(): Promise<void> {
  for (const step of undo.reverse()) await step();
}

async function run(): Promise<void> {
  // undone last: whoever waits for the file to go knows that nothing is left
  undo.push(clearState);
  if (!process.env.REDSHANK_TEST_PG) {
    const cluster = startThrowaway();
    undo.push(() => cluster.stop());
    process.env.REDSHANK_TEST_PG = cluster.adminUrl;
  }
  const folder = mkdtempSync(join(tmpdir(), 'redshank-app-'));
  undo.push(() => rmSync(folder, { recursive: true, force: true }));
  const dataFolder = join(folder, 'data');
  const mailFolder = join(folder, 'mail');
  mkdirSync(join(dataFolder, 'secrets'), { recursive: true, mode: 0o700 });
  const mail = await catchMail(mailFolder);
  undo.push(() => mail.stop());
  const database = await emptyDatabase();
  undo.push(() => database.drop());

  const port = execFileSync('node', ['docker-free-scripts/port.mjs', 'free'], {
    cwd: root,
    encoding: 'utf8',
  }).trim();
  const url = `http://127.0.0.1:${port}`;
  const demoPassword = randomBytes(12).toString('base64url');
  const app = spawn('node', ['--enable-source-maps', 'dist/server/main.js'], {
    cwd: root,
    stdio: ['ignore', 'inherit', 'inherit'],
    env: {
      ...withoutSettings(process.env),
      HOST: '127.0.0.1',
      PORT: port,
      PUBLIC_URL: url,
      REDSHANK_DATA: dataFolder,
      REDSHANK_SECRETS_DIR: join(dataFolder, 'secrets'),
      REDSHANK_DEMO_PASSWORD: demoPassword,
      DATABASE_URL: database.appUrl,
      DATABASE_OWNER_URL: database.ownerUrl,
      DATABASE_JOBS_URL: database.jobsUrl,
      REDSHANK_SMTP_URL: mail.url,
    },
  });
  undo.push(() => stopped(app));
  app.once('exit', () => ended.abort());
  await answers(url, app);
  const { appUrl, ownerUrl, jobsUrl } = database;
  writeState({
    pid: process.pid,
    url,
    demoPassword,
    dataFolder,
    mailFolder,
    appUrl,
    ownerUrl,
    jobsUrl,
  });
  await pause(2 ** 31 - 1, undefined, { signal: ended.signal });
}

async function stopped(app: ChildProcess): Promise<void> {
  if (app.exitCode !== null || app.signalCode !== null) return;
  const gone = once(app, 'exit');
  app.kill('SIGTERM');
  const force = setTimeout(() => app.kill('SIGKILL'), 15_000);
  await gone;
  clearTimeout(force);
}

function isAlive(pid: number): boolean {
  try {
    return process.kill(pid, 0);
  } catch {
    return false;
  }
}

clearState();
process.on('SIGTERM', () => ended.abort());
process.on('SIGINT', () => ended.abort());
setInterval(() => isAlive(watched) || ended.abort(), 1000).unref();
try {
  await run();
} catch (error) {
  if (!ended.signal.aborted) throw error;
} finally {
  await tidyUp();
}

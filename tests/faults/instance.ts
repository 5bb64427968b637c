import { execFileSync, spawn, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { mkdtemp, open, readFile, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { setTimeout as pause } from 'node:timers/promises';
import { build } from 'esbuild';
import type { DatabaseUrls } from '#tests/support/admin.ts';
import { freshDatabase } from '#tests/support/database.ts';
import { startLasting } from '#tests/support/throwaway.ts';

const root = fileURLToPath(new URL('../../', import.meta.url));

export const VICTIMS = ['server', 'worker', 'database'] as const;
export type Victim = (typeof VICTIMS)[number];

/** A whole instance, its parts each in a process of their own, that can be killed and started again. */
export interface Instance {
  readonly url: string;
  readonly data: string;
  readonly urls: DatabaseUrls;
  /** SIGKILL: nothing is said, nothing tidied up. */
  readonly kill: (victim: Victim) => Promise<void>;
  readonly again: (victim: Victim) => Promise<void>;
  /** The log of all parts. */
  readonly said: () => Promise<string>;
  readonly close: () => Promise<void>;
}

const bundle = async (outdir: string): Promise<void> => {
  await build({
    entryPoints: {
      main: join(root, 'server/main/start.ts'),
      'derive-thread': join(root, 'server/features/readings/derive-thread.ts'),
    },
    outdir,
    bundle: true,
    platform: 'node',
    format: 'esm',
    target: 'node20',
    packages: 'external',
    logLevel: 'warning',
  });
};

const ended = async (child: ChildProcess): Promise<void> => {
  if (child.exitCode !== null || child.signalCode !== null) return;
  const gone = once(child, 'exit');
  child.kill('SIGKILL');
  await gone;
};

/** A part that could not be started because the database was away would be started again by whoever runs it. */
const KEEP_TRYING = 20;

export const startInstance = async (): Promise<Instance> => {
  const before = process.env.REDSHANK_TEST_PG;
  const cluster = startLasting();
  process.env.REDSHANK_TEST_PG = cluster.adminUrl;
  const database = await freshDatabase();
  const data = await mkdtemp(join(tmpdir(), 'redshank-faults-'));
  const program = join(root, 'tests/.out', `faults-${process.pid}`);
  await bundle(program);
  const log = await open(join(data, 'log'), 'w');
  const port = execFileSync('node', ['docker-free-scripts/port.mjs', 'free'], {
    cwd: root,
    encoding: 'utf8',
  }).trim();
  const url = `http://127.0.0.1:${port}`;
  const children = new Map<Victim, ChildProcess>();

  const start = (part: 'server' | 'worker'): ChildProcess => {
    const child = spawn(
      'node',
      [join(program, 'main.js'), '--only', part === 'server' ? 'web' : 'worker'],
      {
        cwd: root,
        stdio: ['ignore', log.fd, log.fd],
        env: {
          PATH: process.env.PATH,
          HOME: process.env.HOME,
          NODE_ENV: 'test',
          HOST: '127.0.0.1',
          PORT: port,
          PUBLIC_URL: url,
          REDSHANK_DATA: data,
          REDSHANK_DEMO: '0',
          REDSHANK_LOG: 'info',
          DATABASE_URL: database.appUrl,
          DATABASE_OWNER_URL: database.ownerUrl,
          DATABASE_JOBS_URL: database.jobsUrl,
        },
      },
    );
    children.set(part, child);
    return child;
  };
  const isUp = async (): Promise<boolean> => {
    const health = await fetch(`${url}/api/health`).catch(() => null);
    const said = health?.ok ? ((await health.json()) as { status: string; worker: boolean }) : null;
    return said?.status === 'ok' && said.worker;
  };
  const up = async (): Promise<void> => {
    for (let tries = 0; !(await isUp());) {
      for (const part of ['server', 'worker'] as const) {
        const child = children.get(part);
        if (child && child.exitCode === null && child.signalCode === null) continue;
        if (tries++ > KEEP_TRYING) throw new Error(`the ${part} does not start`);
        start(part);
      }
      await pause(50);
    }
  };

  start('server');
  await up();
  return {
    url,
    data,
    urls: database,
    kill: async (victim) => {
      if (victim === 'database') await cluster.kill();
      else {
        const child = children.get(victim);
        if (child) await ended(child);
      }
    },
    again: async (victim) => {
      if (victim === 'database') await cluster.again();
      await up();
    },
    said: () => readFile(join(data, 'log'), 'utf8'),
    close: async () => {
      for (const child of children.values()) await ended(child);
      await log.close();
      cluster.stop();
      await rm(data, { recursive: true, force: true });
      await rm(program, { recursive: true, force: true });
      if (before === undefined) delete process.env.REDSHANK_TEST_PG;
      else process.env.REDSHANK_TEST_PG = before;
    },
  };
};

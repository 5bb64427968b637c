import { execFileSync, spawn, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { open, readFile, rm } from 'node:fs/promises';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { setTimeout as pause } from 'node:timers/promises';
import { build } from 'esbuild';
import type { DatabaseUrls } from '#tests/support/admin.ts';
import { freshDatabase } from '#tests/support/database.ts';
import { startLasting } from '#tests/support/throwaway.ts';
import { mountDisk } from './disk.ts';
import { dataIn, ownFolder } from './folder.ts';
import { openLine } from './line.ts';

const root = fileURLToPath(new URL('../../', import.meta.url));

/** What can go wrong with an instance. */
export const FAULTS = ['server', 'worker', 'database', 'network', 'line', 'disk'] as const;
export type Fault = (typeof FAULTS)[number];
export const FAULT_WORDS: Readonly<Record<Fault, string>> = {
  server: 'the server killed',
  worker: 'the worker killed',
  database: 'the database killed',
  network: 'the network cut',
  line: 'the line to the database cut',
  disk: 'the disk full',
};

/** A whole instance, its parts each in a process of their own, that things can go wrong with. */
export interface Instance {
  /** Where people reach it: over the network that can be cut. */
  readonly url: string;
  readonly data: string;
  readonly urls: DatabaseUrls;
  /** Has a disk of its own: where this person may mount none, it cannot be full. */
  readonly canBeFull: boolean;
  /** Kills with SIGKILL, cuts in the middle: nothing is said, nothing tidied up. */
  readonly begin: (fault: Fault) => Promise<void>;
  /** Puts it right, as whoever runs it would. */
  readonly end: (fault: Fault) => Promise<void>;
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
  const folder = await ownFolder();
  const data = dataIn(folder);
  const disk = mountDisk(data);
  const line = await openLine(Number(new URL(database.appUrl).port));
  const overLine = (address: string): string => {
    const url = new URL(address);
    url.port = String(line.port);
    return url.href;
  };
  const program = join(root, 'tests/.out', `faults-${process.pid}`);
  await bundle(program);
  const log = await open(join(folder, 'log'), 'w');
  const port = execFileSync('node', ['docker-free-scripts/port.mjs', 'free'], {
    cwd: root,
    encoding: 'utf8',
  }).trim();
  const network = await openLine(Number(port));
  const url = `http://127.0.0.1:${network.port}`;
  const children = new Map<'server' | 'worker', ChildProcess>();

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
          DATABASE_URL: overLine(database.appUrl),
          DATABASE_OWNER_URL: overLine(database.ownerUrl),
          DATABASE_JOBS_URL: overLine(database.jobsUrl),
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
  let isClosing = false;
  const up = async (): Promise<void> => {
    for (let tries = 0; !isClosing && !(await isUp());) {
      for (const part of ['server', 'worker'] as const) {
        const child = children.get(part);
        if (child && child.exitCode === null && child.signalCode === null) continue;
        if (tries++ > KEEP_TRYING) throw new Error(`the ${part} does not start`);
        start(part);
      }
      await pause(50);
    }
  };

  const killed = async (part: 'server' | 'worker'): Promise<void> => {
    const child = children.get(part);
    if (child) await ended(child);
  };

  start('server');
  await up();
  const ends: Readonly<Record<Fault, readonly [begin: () => unknown, end: () => unknown]>> = {
    server: [() => killed('server'), () => undefined],
    worker: [() => killed('worker'), () => undefined],
    database: [() => cluster.kill(), () => cluster.again()],
    network: [network.cut, network.mend],
    line: [line.cut, line.mend],
    disk: [() => disk?.fill(), () => disk?.free()],
  };
  return {
    url,
    data,
    urls: database,
    canBeFull: disk !== null,
    begin: async (fault) => {
      await ends[fault][0]();
    },
    end: async (fault) => {
      await ends[fault][1]();
      await up();
    },
    said: () => readFile(join(folder, 'log'), 'utf8'),
    close: async () => {
      isClosing = true;
      for (const child of children.values()) await ended(child);
      await network.close();
      await line.close();
      await log.close();
      cluster.stop();
      disk?.unmount();
      await rm(folder, { recursive: true, force: true });
      await rm(program, { recursive: true, force: true });
      if (before === undefined) delete process.env.REDSHANK_TEST_PG;
      else process.env.REDSHANK_TEST_PG = before;
    },
  };
};

import { execFile, execFileSync } from 'node:child_process';
import { promisify } from 'node:util';
import { fileURLToPath } from 'node:url';

const script = fileURLToPath(
  new URL('../../docker-free-scripts/postgres/throwaway.sh', import.meta.url),
);

const run = (...args: string[]) =>
  execFileSync('bash', [script, ...args], {
    encoding: 'utf8',
    stdio: ['ignore', 'pipe', 'inherit'],
  });

/** A PostgreSQL cluster in a temporary folder. */
export interface Throwaway {
  /** signs in as the superuser redshank_admin; the product's roles have the same password */
  adminUrl: string;
  stop(): void;
}

/** Starts one. It ends with `stop` or, should this process be killed, by itself. */
export function startThrowaway(): Throwaway {
  const adminUrl = run('start', String(process.pid)).trim();
  return { adminUrl, stop: () => void run('stop', adminUrl) };
}

/** One that can be killed and started again, and then has what it had committed. */
export interface Lasting extends Throwaway {
  kill(): Promise<void>;
  again(): Promise<void>;
}

const beside = async (...args: string[]): Promise<void> => {
  await promisify(execFile)('bash', [script, ...args]);
};

export function startLasting(): Lasting {
  const adminUrl = run('start', String(process.pid), 'lasting').trim();
  return {
    adminUrl,
    stop: () => void run('stop', adminUrl),
    kill: () => beside('kill', adminUrl),
    again: () => beside('again', adminUrl),
  };
}

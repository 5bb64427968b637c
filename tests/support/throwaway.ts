import { execFileSync } from 'node:child_process';
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

import { execFileSync } from 'node:child_process';
import { fileURLToPath } from 'node:url';

const scripts = fileURLToPath(new URL('..', import.meta.url));

/** For tests: runs a line of bash with the scripts' functions on a data folder; returns its standard output. */
export function onInstance(data: string, line: string): string {
  const sources = ['lib.sh', 'data-folder.sh', 'postgres/server.sh', 'postgres/instance.sh']
    .map((name) => `source '${scripts}${name}'`)
    .join('; ');
  return execFileSync('bash', ['-c', `${sources}; use_data_folder; ${line}`], {
    encoding: 'utf8',
    env: { ...process.env, REDSHANK_DATA: data },
    stdio: ['ignore', 'pipe', 'pipe'],
  });
}

import { execFileSync, spawn } from 'node:child_process';
import { once } from 'node:events';
import { chmodSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';

const root = fileURLToPath(new URL('../../../', import.meta.url));

/** A place for one instance's data, and a port. */
export interface Place {
  data: string;
  port: string;
  remove(): void;
}

export function newPlace(): Place {
  const parent = mkdtempSync(join(tmpdir(), 'redshank-start-'));
  // as root, the database's user must be able to pass
  chmodSync(parent, 0o755);
  const port = execFileSync('node', ['docker-free-scripts/port.mjs', 'free'], {
    cwd: root,
    encoding: 'utf8',
  }).trim();
  return {
    data: join(parent, 'data'),
    port,
    remove: () => rmSync(parent, { recursive: true, force: true }),
  };
}

/** One `npm start`. */
export interface Start {
  said(): string;
  /** resolves when it has said so, rejects when it ends before */
  untilItSays(words: string): Promise<void>;
  /** exit status after this signal, or after it ended by itself */
  end(signal?: NodeJS.Signals): Promise<number | null>;
}

export function npmStart({ data, port }: Place): Start {
  const child = spawn('npm', ['start'], {
    cwd: root,
    env: { ...process.env, REDSHANK_DATA: data, PORT: port },
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  let said = '';
  const ended = once(child, 'close');
  for (const stream of [child.stdout, child.stderr]) {
    stream.setEncoding('utf8').on('data', (text: string) => {
      said += text;
      child.emit('said');
    });
  }
  return {
    said: () => said,
    async untilItSays(words) {
      while (!said.includes(words)) {
        const what = await Promise.race([once(child, 'said'), ended.then(() => 'ended')]);
        if (what === 'ended' && !said.includes(words)) throw new Error(`npm start ended:\n${said}`);
      }
    },
    async end(signal) {
      if (signal) child.kill(signal);
      await ended;
      return child.exitCode;
    },
  };
}

/** The port of an instance's database. */
export const databasePort = ({ data }: Place): string =>
  readFileSync(join(data, 'secrets/database-port'), 'utf8').trim();

export function isPortFree(port: string): boolean {
  try {
    execFileSync('node', ['docker-free-scripts/port.mjs', 'check', '127.0.0.1', port], {
      cwd: root,
    });
    return true;
  } catch {
    return false;
  }
}

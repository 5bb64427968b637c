import { mkdir, mkdtemp, readdir, rm, stat } from 'node:fs/promises';
import { hostname } from 'node:os';
import { join } from 'node:path';

/** Long enough for the longest preparation, on machines whose processes cannot be asked for from here. */
const STRANGER_MS = 24 * 3_600_000;

/** A machine's name as a part of a folder's name. */
const HERE = hostname().replaceAll(/[^A-Za-z0-9]/g, '') || 'here';

export const isAlive = (pid: number): boolean => {
  try {
    process.kill(pid, 0);
    return true;
  } catch (error) {
    return error instanceof Error && 'code' in error && error.code === 'EPERM';
  }
};

/** Temporary folders under one parent, named after machine and process so that leftovers are told from work. */
export class TempDirs {
  readonly #parent: string;

  constructor(parent: string) {
    this.#parent = parent;
  }

  async with<T>(use: (path: string) => Promise<T>): Promise<T> {
    await mkdir(this.#parent, { recursive: true, mode: 0o700 });
    const path = await mkdtemp(join(this.#parent, `${HERE}-${process.pid}-`));
    try {
      return await use(path);
    } finally {
      await rm(path, { recursive: true, force: true });
    }
  }

  /** Removes what killed processes of this machine left behind, and what others left a day ago. */
  async clear(): Promise<void> {
    for (const name of await readdir(this.#parent).catch(() => [])) {
      const path = join(this.#parent, name);
      if (await this.#isLeft(name, path)) await rm(path, { recursive: true, force: true });
    }
  }

  async #isLeft(name: string, path: string): Promise<boolean> {
    const [machine, pid] = name.split('-');
    if (machine === HERE && /^\d+$/.test(pid ?? '')) return !isAlive(Number(pid));
    const found = await stat(path).catch(() => null);
    return found !== null && Date.now() - found.mtimeMs > STRANGER_MS;
  }
}

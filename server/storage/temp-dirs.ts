import { mkdir, mkdtemp, readdir, rm, stat } from 'node:fs/promises';
import { join } from 'node:path';

/** Temporary folders under one parent. What a killed process left behind is cleared at the next start. */
export class TempDirs {
  readonly #parent: string;

  constructor(parent: string) {
    this.#parent = parent;
  }

  async with<T>(use: (path: string) => Promise<T>): Promise<T> {
    await mkdir(this.#parent, { recursive: true, mode: 0o700 });
    const path = await mkdtemp(join(this.#parent, 'work-'));
    try {
      return await use(path);
    } finally {
      await rm(path, { recursive: true, force: true });
    }
  }

  /** @param olderThanMs so that a second process does not clear what the first is working on */
  async clear(olderThanMs: number): Promise<void> {
    const names = await readdir(this.#parent).catch(() => []);
    for (const name of names) {
      const path = join(this.#parent, name);
      const age = Date.now() - (await stat(path).catch(() => ({ mtimeMs: Infinity }))).mtimeMs;
      if (age > olderThanMs) await rm(path, { recursive: true, force: true });
    }
  }
}

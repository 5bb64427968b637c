import { randomBytes } from 'node:crypto';
import { mkdir, readFile, writeFile } from 'node:fs/promises';
import { join } from 'node:path';

const isCode = (error: unknown, code: string): boolean =>
  error instanceof Error && 'code' in error && error.code === code;

/** A secret of this instance in a file that only its owner can read. */
export class SecretFile {
  readonly #folder: string;
  readonly #path: string;

  constructor(folder: string, name: string) {
    this.#folder = folder;
    this.#path = join(folder, name);
  }

  async read(): Promise<string | null> {
    try {
      return (await readFile(this.#path, 'utf8')).trim() || null;
    } catch (error) {
      if (isCode(error, 'ENOENT')) return null;
      throw error;
    }
  }

  async write(value: string): Promise<void> {
    await mkdir(this.#folder, { recursive: true, mode: 0o700 });
    await writeFile(this.#path, `${value}\n`, { mode: 0o600 });
  }

  /** The stored secret, or a new random one: the first of several processes makes it for all. */
  async readOrMake(bytes: number): Promise<string> {
    await mkdir(this.#folder, { recursive: true, mode: 0o700 });
    try {
      await writeFile(this.#path, `${randomBytes(bytes).toString('base64url')}\n`, {
        mode: 0o600,
        flag: 'wx',
      });
    } catch (error) {
      if (!isCode(error, 'EEXIST')) throw error;
    }
    const value = await this.read();
    if (value === null) throw new Error(`${this.#path} is empty: delete it and start again.`);
    return value;
  }
}

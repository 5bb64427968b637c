import { randomUUID } from 'node:crypto';
import { createReadStream, createWriteStream } from 'node:fs';
import { access, constants, mkdir, open, rename, rm, rmdir, stat } from 'node:fs/promises';
import { dirname, join } from 'node:path';
import type { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import {
  type ByteRange,
  checkedKey,
  MissingFile,
  type Storage,
  type StoredFile,
  type UseLocalFile,
} from './storage.ts';
import { TempDirs } from './temp-dirs.ts';

const isMissing = (error: unknown): boolean =>
  error instanceof Error &&
  'code' in error &&
  (error.code === 'ENOENT' || error.code === 'ENOTDIR');

/** Files in a folder of this machine. Temporary files lie beside them, on the same disk. */
export class LocalStorage implements Storage {
  readonly incoming: string;
  readonly #files: string;
  readonly #temp: TempDirs;

  private constructor(root: string) {
    this.#files = join(root, 'files');
    this.incoming = join(root, 'incoming');
    this.#temp = new TempDirs(join(root, 'temp'));
  }

  static async open(root: string): Promise<LocalStorage> {
    const storage = new LocalStorage(root);
    await mkdir(storage.#files, { recursive: true, mode: 0o700 });
    await mkdir(storage.incoming, { recursive: true, mode: 0o700 });
    await storage.#temp.clear();
    return storage;
  }

  #path(key: string): string {
    return join(this.#files, checkedKey(key));
  }

  async putFile(key: string, localPath: string): Promise<void> {
    const path = this.#path(key);
    const handle = await open(localPath, 'r+');
    try {
      await handle.sync();
    } finally {
      await handle.close();
    }
    await mkdir(dirname(path), { recursive: true, mode: 0o700 });
    await rename(localPath, path);
  }

  async putStream(key: string, stream: Readable): Promise<void> {
    const path = this.#path(key);
    await this.#temp.with(async (folder) => {
      const temporary = join(folder, randomUUID());
      await pipeline(stream, createWriteStream(temporary, { mode: 0o600, flush: true }));
      await mkdir(dirname(path), { recursive: true, mode: 0o700 });
      await rename(temporary, path);
    });
  }

  async stat(key: string): Promise<StoredFile> {
    try {
      const found = await stat(this.#path(key));
      return { bytes: found.size, modified: found.mtime };
    } catch (error) {
      throw isMissing(error) ? new MissingFile(key) : error;
    }
  }

  async read(key: string, range?: ByteRange): Promise<Readable> {
    await this.stat(key);
    return createReadStream(this.#path(key), range);
  }

  async exists(key: string): Promise<boolean> {
    return this.stat(key).then(
      () => true,
      (error: unknown) => {
        if (error instanceof MissingFile) return false;
        throw error;
      },
    );
  }

  async delete(key: string): Promise<void> {
    const path = this.#path(key);
    await rm(path, { force: true });
    await rmdir(dirname(path)).catch(() => undefined);
  }

  async deleteAll(prefix: string): Promise<void> {
    await rm(this.#path(prefix), { recursive: true, force: true });
  }

  async withLocalFile<T>(key: string, use: UseLocalFile<T>): Promise<T> {
    await this.stat(key);
    return use(this.#path(key), () => Promise.resolve());
  }

  withTempDir<T>(use: (path: string) => Promise<T>): Promise<T> {
    return this.#temp.with(use);
  }

  async healthy(): Promise<boolean> {
    return access(this.#files, constants.W_OK).then(
      () => true,
      () => false,
    );
  }
}

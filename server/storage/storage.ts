import type { Readable } from 'node:stream';

/** Inclusive bounds in bytes, as ranges of HTTP are. */
export interface ByteRange {
  readonly start: number;
  readonly end: number;
}

export interface StoredFile {
  readonly bytes: number;
  readonly modified: Date;
}

/** A key that leads nowhere: the row is there, the file is not. */
export class MissingFile extends Error {
  override readonly name = 'MissingFile';
}

export type UseLocalFile<T> = (path: string, putBack: () => Promise<void>) => Promise<T>;

/**
 * Where files lie, by key: `PRACTICE/clips/CLIP/bench.mp4`. A file appears under its key whole or not at all.
 * Full disks reject with the system's ENOSPC, which the problem handler knows.
 */
export interface Storage {
  /** Moves a finished local file in; the local file is gone afterwards. */
  putFile(key: string, localPath: string, contentType: string): Promise<void>;
  putStream(key: string, stream: Readable, contentType: string): Promise<void>;
  /** @throws MissingFile */
  stat(key: string): Promise<StoredFile>;
  /** @throws MissingFile */
  read(key: string, range?: ByteRange): Promise<Readable>;
  exists(key: string): Promise<boolean>;
  /** Fine where there is nothing. */
  delete(key: string): Promise<void>;
  /** Everything whose key begins with `prefix` + '/'. */
  deleteAll(prefix: string): Promise<void>;
  /**
   * Hands over a path under which the file can be read, for programs that seek: the file itself where it is
   * local, a temporary copy otherwise, removed after `use`.
   * @param use what it changes at the path is under the key once `putBack` has ended
   * @throws MissingFile
   */
  withLocalFile<T>(key: string, use: UseLocalFile<T>): Promise<T>;
  /** An empty folder on the disk where finished files go, so that moving them in copies nothing; removed after. */
  withTempDir<T>(use: (path: string) => Promise<T>): Promise<T>;
  /** A folder that stays, for uploads that take days; on the same disk. */
  readonly incoming: string;
  /** Whether it can be written to now. */
  healthy(): Promise<boolean>;
}

const KEY = /^[A-Za-z0-9][A-Za-z0-9._-]*(\/[A-Za-z0-9][A-Za-z0-9._-]*)*$/;

/** Keys are made by the server alone; this is the last wall against one that walks out of its folder. */
export const checkedKey = (key: string): string => {
  if (!KEY.test(key)) throw new Error('A storage key must be plain path segments.');
  return key;
};

import { mkdtemp, readdir, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { isAlive } from '#server/storage/temp-dirs.ts';
import { unmount } from './disk.ts';

const NAME = 'redshank-faults-';

/** Removes what runs that were killed have left behind. */
const sweep = async (): Promise<void> => {
  for (const name of await readdir(tmpdir())) {
    const pid = Number(name.slice(NAME.length).split('-')[0]);
    if (!name.startsWith(NAME) || !Number.isInteger(pid) || isAlive(pid)) continue;
    const folder = join(tmpdir(), name);
    try {
      unmount(dataIn(folder));
    } catch {
      // it had no disk of its own
    }
    await rm(folder, { recursive: true, force: true });
  }
};

/** What the instance keeps, its log apart: on a disk that can be full where one can be mounted. */
export const dataIn = (folder: string): string => join(folder, 'data');

/** Where an instance keeps what it has, by the process that runs it. */
export const ownFolder = async (): Promise<string> => {
  await sweep();
  return mkdtemp(join(tmpdir(), `${NAME}${process.pid}-`));
};

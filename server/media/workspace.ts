import { randomUUID } from 'node:crypto';
import { mkdir, readdir, rename, rm } from 'node:fs/promises';
import { basename, dirname, join, resolve } from 'node:path';

/**
 * A folder that nobody sees until it is whole. It lies beside its final place, on the same disk, so
 * that one rename publishes it; whatever a killed run left behind there is swept by the next.
 */
export interface Workspace {
  readonly path: string;
  publish(): Promise<void>;
  discard(): Promise<void>;
}

/**
 * The caller holds the lock of this clip: two runs for the same folder would sweep each other.
 * @param outDir the folder's final place
 */
export async function openWorkspace(outDir: string): Promise<Workspace> {
  const final = resolve(outDir);
  await mkdir(dirname(final), { recursive: true });
  await sweep(final);
  const path = `${final}.part-${randomUUID()}`;
  await mkdir(path);
  const discard = () => rm(path, { recursive: true, force: true });
  const publish = async () => {
    const old = `${final}.old-${randomUUID()}`;
    await rename(final, old).catch(ignoreMissing);
    await rename(path, final);
    await rm(old, { recursive: true, force: true });
  };
  return { path, publish, discard };
}

/** Removes what killed runs for this folder left behind. */
export async function sweep(outDir: string): Promise<void> {
  const final = resolve(outDir);
  const names = await readdir(dirname(final)).catch(() => []);
  const leftover = names.filter((name) =>
    ['.part-', '.old-'].some((mark) => name.startsWith(basename(final) + mark)),
  );
  for (const name of leftover)
    await rm(join(dirname(final), name), { recursive: true, force: true });
}

/** The same for a single file: written beside its place, then renamed. */
export async function writeWhole<T>(
  path: string,
  write: (temporary: string) => Promise<T>,
): Promise<T> {
  const final = resolve(path);
  await mkdir(dirname(final), { recursive: true });
  const temporary = `${final}.part-${randomUUID()}`;
  try {
    const result = await write(temporary);
    await rename(temporary, final);
    return result;
  } catch (error) {
    await rm(temporary, { force: true });
    throw error;
  }
}

function ignoreMissing(error: NodeJS.ErrnoException): void {
  if (error.code !== 'ENOENT') throw error;
}

import { execFileSync } from 'node:child_process';
import { mkdirSync } from 'node:fs';
import { open, rm } from 'node:fs/promises';
import { join } from 'node:path';

/** What all that 200 runs keep fits into. */
const MEGABYTES = 384;
const PIECE = Buffer.alloc(1 << 20);

const asRoot = (command: string, ...args: string[]): void => {
  const [program, ...before] = process.getuid?.() === 0 ? [command] : ['sudo', '-n', command];
  execFileSync(program ?? command, [...before, ...args], { stdio: 'ignore' });
};

/** A disk of an instance's own, that can be full. */
export interface Disk {
  readonly fill: () => Promise<void>;
  readonly free: () => Promise<void>;
  readonly unmount: () => void;
}

export const unmount = (at: string): void => {
  asRoot('umount', '--lazy', at);
};

const isFull = (error: unknown): boolean =>
  error instanceof Error && 'code' in error && error.code === 'ENOSPC';

/** Mounts one; null where this person may mount nothing. */
export const mountDisk = (at: string): Disk | null => {
  mkdirSync(at, { recursive: true, mode: 0o700 });
  const owner = `uid=${process.getuid?.() ?? 0},gid=${process.getgid?.() ?? 0}`;
  try {
    asRoot('mount', '-t', 'tmpfs', '-o', `size=${MEGABYTES}m,mode=0700,${owner}`, 'tmpfs', at);
  } catch {
    return null;
  }
  const ballast = join(at, 'ballast');
  return {
    fill: async () => {
      const file = await open(ballast, 'w');
      try {
        // down to the last byte: a piece that is written in part is full too
        for (;;) await file.writeFile(PIECE);
      } catch (error) {
        if (!isFull(error)) throw error;
      } finally {
        await file.close();
      }
    },
    free: () => rm(ballast, { force: true }),
    unmount: () => unmount(at),
  };
};

import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join, relative } from 'node:path';
import { fileURLToPath } from 'node:url';
import type { PreparedTestCopy } from '../../fixtures/video/prepare-copy.ts';
import { type RangeServer, startRangeServer } from '../../fixtures/video/range-server.ts';
import type { OpenRequest } from './page.ts';

/** The page of these tests, served beside a folder of clips that vanishes at the end. */
export interface ClipServer extends RangeServer {
  readonly folder: string;
  request(copy: PreparedTestCopy): OpenRequest;
}

export const startClipServer = async (): Promise<ClipServer> => {
  const folder = await mkdtemp(join(tmpdir(), 'frames-'));
  const page = fileURLToPath(new URL('page.ts', import.meta.url));
  const server = await startRangeServer(page, folder);
  return {
    ...server,
    folder,
    request: ({ path, timeBase, ticks, width, height }) => ({
      ...{ url: `/clips/${relative(folder, path)}`, timeBase, ticks, width, height },
    }),
    async close() {
      await server.close();
      await rm(folder, { recursive: true, force: true });
    },
  };
};

export const upTo = (count: number): number[] => Array.from({ length: count }, (_, n) => n);

/** Seeded, so that a wrong frame is found again: 200 places of a clip. */
export const randomJumps = (frameCount: number, jumps = 200): number[] => {
  let state = 20260718;
  return upTo(jumps).map(() => {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    return Math.floor((state / 2 ** 32) * frameCount);
  });
};

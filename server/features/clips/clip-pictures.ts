import { join } from 'node:path';
import { exactFrame, frameSheet, originalTimestamp } from '#server/media/exact-frame.ts';
import { sheetColumns, sheetRows } from '#server/media/limits.ts';
import type { FrameTable } from '#server/media/types.ts';
import type { Storage } from '#server/storage/storage.ts';
import { Problem } from '../../http/problem.ts';
import type { Clip } from './clip.entity.ts';
import { frameCountOf, needFrames } from './clip-in-sight.ts';
import { frameKey, sheetKey } from './clip-files.ts';
import { madeOnce } from './made-once.ts';

const tableOf = (clip: Clip): FrameTable => {
  const table = clip.frames.unwrap();
  if (!table) throw new Problem('clip-not-ready');
  const { timeBase, ticks } = table;
  return { timeBase, ticks, us: [] };
};

/**
 * Makes a picture in a temporary folder and moves it to its key; does nothing where it lies there.
 * @throws MissingFile
 */
const kept = async (
  storage: Storage,
  key: string,
  make: (path: string) => Promise<unknown>,
): Promise<string> => {
  if (!(await storage.exists(key)))
    await madeOnce(key, () =>
      storage.withTempDir(async (folder) => {
        const path = join(folder, 'picture.jpg');
        await make(path);
        await storage.putFile(key, path, 'image/jpeg');
      }),
    );
  return key;
};

/**
 * Key of frame `index` at the phone's own resolution, from the original by its exact time.
 * @param clip with the lazy `frames` loaded
 */
export const fullFrame = (storage: Storage, clip: Clip, index: number): Promise<string> => {
  needFrames(clip, index);
  const { origin } = clip;
  if (!origin) throw new Problem('clip-not-ready');
  const at = originalTimestamp(origin, tableOf(clip), index);
  return kept(storage, frameKey(clip.practiceId, clip.id, index), (path) =>
    storage.withLocalFile(clip.files.original, (original) => exactFrame({ original, at, path })),
  );
};

/**
 * Key of a sheet of thirty frames of the copy.
 * @param clip with the lazy `frames` loaded
 */
export const sheet = (storage: Storage, clip: Clip, index: number): Promise<string> => {
  const first = index * sheetColumns * sheetRows;
  if (first >= frameCountOf(clip)) throw new Problem('frame-out-of-range');
  const { bench } = clip.files;
  const size = clip.copies?.bench;
  if (!bench || !size) throw new Problem('clip-not-ready');
  return kept(storage, sheetKey(clip.practiceId, clip.id, index), (path) =>
    storage.withLocalFile(bench, (benchCopy) =>
      frameSheet({ benchCopy, size, frames: tableOf(clip), first, path }),
    ),
  );
};

import { rm } from 'node:fs/promises';
import { join } from 'node:path';
import { product } from '../../../db/in-practice.ts';
import { enqueue, handles, type JobContext } from '../../../jobs/job.ts';
import type { Ground } from '../../../main/ground.ts';
import { Erasure } from '../erasure.entity.ts';
import { ERASE_FILES } from './erase-files-type.ts';

/** The longest that a preparation which was under way may go on and still put its copies down. */
const AGAIN_AFTER_MS = 70 * 60_000;

const erasureOf = (ground: Ground, practiceId: string, id: string) =>
  ground.inPractice(product(practiceId), ({ em }) => em.findOne(Erasure, { id }));

const sweep = async (
  { storage }: Ground,
  { prefixes, uploads }: Pick<Erasure, 'prefixes' | 'uploads'>,
  signal: AbortSignal,
): Promise<void> => {
  for (const prefix of prefixes) {
    signal.throwIfAborted();
    await storage.deleteAll(prefix);
  }
  for (const id of uploads)
    for (const name of [id, `${id}.json`]) await rm(join(storage.incoming, name), { force: true });
};

/**
 * Deleting twice is fine, so it begins anew wherever it was killed. Done means that no file is left; a second sweep
 * comes when no work of that time can be under way any more, and then the names of the files go as well.
 */
const run = async ({
  ground,
  practiceId,
  payload: { erasureId, again = false },
  signal,
}: JobContext<{ erasureId: string; again?: boolean | undefined }>): Promise<void> => {
  const erasure = await erasureOf(ground, practiceId, erasureId);
  if (!erasure) return;
  await sweep(ground, erasure, signal);
  await ground.inPractice(product(practiceId), async (unit) => {
    const row = await unit.em.findOneOrFail(Erasure, { id: erasureId });
    if (again) unit.em.assign(row, { prefixes: [], uploads: [] });
    else if (!row.doneAt) {
      row.doneAt = new Date();
      const startAfter = new Date(Date.now() + AGAIN_AFTER_MS);
      await enqueue(unit, ERASE_FILES, { erasureId, again: true }, { startAfter });
    }
  });
};

export const eraseFilesJob = handles({
  type: ERASE_FILES,
  lockKey: ({ erasureId, again = false }) => `${erasureId}${again ? ' again' : ''}`,
  run,
  expireInMinutes: 60,
  retryLimit: 20,
  retryDelaySeconds: 30,
  unfinished: {
    sql: 'select erasure_id, practice_id from erasures_unfinished()',
    read: (row) => ({
      practiceId: String(row.practice_id),
      payload: { erasureId: String(row.erasure_id) },
    }),
  },
});

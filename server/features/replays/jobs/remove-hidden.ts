import { product } from '../../../db/in-practice.ts';
import { handles, type JobContext } from '../../../jobs/job.ts';
import { ReplayBefore } from '../before/replay-before.entity.ts';
import { hasEnded } from '../hidden-copies.ts';
import { filesOfLink } from '../link-files.ts';
import { KeptFilm } from '../film/kept-film.entity.ts';
import { Replay } from '../replay.entity.ts';
import { REMOVE_HIDDEN } from './remove-hidden-type.ts';

/** Files first: killed between them, the row still names a copy and the job runs again. */
const run = async ({
  ground: { inPractice, storage },
  practiceId,
  payload: { replayId: id },
}: JobContext<{ replayId: string }>): Promise<void> => {
  const files = await inPractice(product(practiceId), async ({ em }) => {
    const replay = await em.findOne(Replay, { id }, { populate: ['rep'] });
    if (!replay || !hasEnded(replay)) return null;
    return filesOfLink(em, replay);
  });
  if (!files) return;
  for (const key of files) await storage.delete(key);
  await inPractice(product(practiceId), async ({ em }) => {
    await em.nativeUpdate(Replay, { id }, { hiddenHead: null });
    await em.nativeUpdate(ReplayBefore, { replay: id }, { hiddenHead: null });
    await em.nativeDelete(KeptFilm, { replay: id });
  });
};

export const removeHiddenJob = handles({
  type: REMOVE_HIDDEN,
  lockKey: ({ replayId }) => replayId,
  run,
  expireInMinutes: 10,
  retryLimit: 10,
  retryDelaySeconds: 60,
  unfinished: {
    sql: 'select replay_id, practice_id from hidden_copies_to_remove()',
    read: (row) => ({
      practiceId: String(row.practice_id),
      payload: { replayId: String(row.replay_id) },
    }),
  },
});

import { join } from 'node:path';
import { prepareClip } from '#server/media/prepare-clip.ts';
import { MediaRefusal } from '#server/media/refusals.ts';
import { scrubLocation } from '#server/media/scrub-location.ts';
import type { PreparedClip } from '#server/media/types.ts';
import { product } from '../../../db/in-practice.ts';
import { handles, type JobContext } from '../../../jobs/job.ts';
import type { Ground } from '../../../main/ground.ts';
import { Clip } from '../clip.entity.ts';
import { clipFiles } from '../clip-files.ts';
import { isHeld, MOST_TRIES } from '../trouble.ts';
import { keepPrepared, keepRefusal } from './keep-outcome.ts';
import { keepStopped, keepTrouble, noteTrouble } from './keep-trouble.ts';
import { lockClip } from './lock-clip.ts';
import { PREPARE_CLIP } from './prepare-clip-type.ts';
import { tellClipState, tellProgress } from './tell-progress.ts';

/** What preparation needs to know; null where the clip is gone or done. */
const begin = (ground: Ground, practiceId: string, clipId: string) =>
  ground.inPractice(product(practiceId), async (unit) => {
    await lockClip(unit.em, clipId);
    const clip = await unit.em.findOne(Clip, { id: clipId }, { populate: ['visit.athlete'] });
    // withdrawn: it waits for a new consent, or goes
    if (clip?.visit.unwrap().athlete.unwrap().deletionDue) return null;
    if (!clip || clip.state === 'ready' || clip.state === 'refused' || isHeld(clip)) return null;
    // still 'preparing': the try before ended with its worker, and might end the next one as well
    if (clip.state === 'preparing' && clip.tries >= MOST_TRIES) {
      await noteTrouble(unit, clip, 'interrupted');
      return null;
    }
    unit.em.assign(clip, { state: 'preparing', progress: 0, secondsLeft: null });
    unit.em.assign(clip, { tries: clip.tries + 1, trouble: null, nextTryAt: null });
    await unit.em.flush();
    await tellClipState(unit, clip);
    return {
      original: clip.files.original,
      originalName: clip.name,
      part: clip.part ?? undefined,
      acceptRemains: clip.acceptRemains,
    };
  });

/** Moves the copies to their place; each appears there whole. */
const store = async (
  { storage }: Ground,
  practiceId: string,
  clipId: string,
  made: PreparedClip,
): Promise<void> => {
  const files = clipFiles(practiceId, clipId);
  await storage.putFile(files.bench, made.bench.path, 'video/mp4');
  await storage.putFile(files.replay, made.replay.path, 'video/mp4');
  await storage.putFile(files.poster, made.poster.path, 'image/jpeg');
  await storage.putFile(files.strip, made.strip.path, 'image/jpeg');
};

/** Makes the copies in a folder that is gone afterwards, and keeps them. */
const prepare = async (
  { ground, practiceId, payload: { clipId }, signal }: JobContext<{ clipId: string }>,
  { original, ...options }: NonNullable<Awaited<ReturnType<typeof begin>>>,
): Promise<void> => {
  const { storage } = ground;
  const began = performance.now();
  await storage.withTempDir(async (folder) => {
    const made = await storage.withLocalFile(original, async (path, putBack) => {
      if ((await scrubLocation(path)) > 0) await putBack();
      return prepareClip({
        ...options,
        original: path,
        outDir: join(folder, 'copies'),
        onProgress: tellProgress(ground, practiceId, clipId),
        signal,
      });
    });
    await store(ground, practiceId, clipId, made);
    const seconds = (performance.now() - began) / 1000;
    await keepPrepared(ground, practiceId, clipId, made, seconds);
  });
};

/**
 * Prepares one clip. Killed at any instant it leaves the clip waiting or preparing, and runs again from the start;
 * the row says 'ready' only once every copy lies in its place. Where the machine fails, the clip says so and names
 * the moment of its next try.
 */
const run = async (context: JobContext<{ clipId: string }>): Promise<void> => {
  const { ground, practiceId, payload, signal } = context;
  const { clipId } = payload;
  const asked = await begin(ground, practiceId, clipId);
  if (!asked) return;
  try {
    await prepare(context, asked);
  } catch (error) {
    if (error instanceof MediaRefusal)
      await keepRefusal(ground, practiceId, clipId, error as MediaRefusal);
    else if (signal.aborted) {
      await keepStopped(ground, practiceId, clipId);
      throw error;
    } else await keepTrouble(ground, practiceId, clipId, error);
  }
};

export const prepareClipJob = handles({
  type: PREPARE_CLIP,
  lockKey: ({ clipId }) => clipId,
  run,
  expireInMinutes: 60,
  retryLimit: 5,
  retryDelaySeconds: 5,
  unfinished: {
    sql: 'select clip_id, practice_id from clips_to_prepare()',
    read: (row) => ({
      practiceId: String(row.practice_id),
      payload: { clipId: String(row.clip_id) },
    }),
  },
});

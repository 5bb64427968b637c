import type { TroubleCode } from '#shared/contracts/clips.ts';
import { product, type ProductActor, type Unit } from '../../../db/in-practice.ts';
import { enqueue } from '../../../jobs/job.ts';
import type { Ground } from '../../../main/ground.ts';
import { Clip } from '../clip.entity.ts';
import { nextTry, troubleOf } from '../trouble.ts';
import { lockClip } from './lock-clip.ts';
import { PREPARE_CLIP } from './prepare-clip-type.ts';
import { tellClipState } from './tell-progress.ts';

const NO_PROGRESS = { progress: null, secondsLeft: null };

/** The clip as this job left it, locked; null where it is gone or has an outcome. */
const inWork = async ({ em }: Unit<ProductActor>, clipId: string): Promise<Clip | null> => {
  await lockClip(em, clipId);
  const clip = await em.findOne(Clip, { id: clipId }, { populate: ['visit.athlete'] });
  return clip?.state === 'preparing' ? clip : null;
};

/**
 * The clip waits and says why, together with the job of its next try where one is due.
 * @param clip locked, with its visit and athlete loaded
 */
export const noteTrouble = async (
  unit: Unit<ProductActor>,
  clip: Clip,
  code: TroubleCode,
): Promise<void> => {
  const startAfter = nextTry(clip.tries, new Date());
  unit.em.assign(clip, {
    ...NO_PROGRESS,
    state: 'waiting',
    trouble: code,
    nextTryAt: startAfter,
  });
  if (startAfter) await enqueue(unit, PREPARE_CLIP, { clipId: clip.id }, { startAfter });
  await unit.em.flush();
  await tellClipState(unit, clip);
};

/** Preparation failed for the machine's sake. */
export const keepTrouble = async (
  { inPractice, log }: Ground,
  practiceId: string,
  clipId: string,
  error: unknown,
): Promise<void> => {
  log.error({ err: error, clipId }, 'a clip could not be prepared');
  await inPractice(product(practiceId), async (unit) => {
    const clip = await inWork(unit, clipId);
    if (clip) await noteTrouble(unit, clip, troubleOf(error));
  });
};

/** The worker stops in good order: the clip waits again, and the try does not count. */
export const keepStopped = (
  { inPractice }: Ground,
  practiceId: string,
  clipId: string,
): Promise<void> =>
  inPractice(product(practiceId), async (unit) => {
    const clip = await inWork(unit, clipId);
    if (!clip) return;
    unit.em.assign(clip, { ...NO_PROGRESS, state: 'waiting', tries: clip.tries - 1 });
    await unit.em.flush();
    await tellClipState(unit, clip);
  });

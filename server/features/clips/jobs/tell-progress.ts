import type { EntityManager } from '@mikro-orm/postgresql';
import type { PreparationProgress } from '#server/media/types.ts';
import { product, type ProductActor } from '../../../db/in-practice.ts';
import { tell } from '../../../events/tell.ts';
import type { Ground } from '../../../main/ground.ts';
import type { Athlete } from '../../athletes/athlete.entity.ts';
import { Clip } from '../clip.entity.ts';

/** A tab hears of progress this often at most. */
const EVERY_MS = 1000;

/**
 * @param clip with its visit and athlete loaded
 * @param progress where it runs ahead of the row
 */
export const tellClipState = (
  unit: { readonly em: EntityManager; readonly actor: ProductActor },
  clip: Clip,
  progress: Pick<Clip, 'progress' | 'secondsLeft'> = clip,
): Promise<void> => {
  const athlete = clip.visit.unwrap().athlete.unwrap() as Athlete;
  return tell(
    unit,
    { coachId: athlete.coach.id },
    {
      type: 'clip',
      clipId: clip.id,
      visitId: clip.visit.id,
      state: clip.state,
      progress: progress.progress ?? null,
      secondsLeft: progress.secondsLeft ?? null,
    },
  );
};

/** Writes progress down and tells the tabs, once a second, one write after the other. */
export const tellProgress = (
  { inPractice, log }: Ground,
  practiceId: string,
  clipId: string,
): ((progress: PreparationProgress) => void) => {
  let last = 0;
  let writing = false;
  return ({ percent, secondsLeft }) => {
    if (writing || Date.now() - last < EVERY_MS) return;
    last = Date.now();
    writing = true;
    inPractice(product(practiceId), async (unit) => {
      const clip = await unit.em.findOne(Clip, { id: clipId }, { populate: ['visit.athlete'] });
      if (clip?.state !== 'preparing') return;
      // By SQL, past the version that the ORM counts: progress is no edit, and whoever changes the clip's facts
      // meanwhile is not in conflict with it.
      await unit.em.execute('update clip set progress = ?, seconds_left = ? where id = ?', [
        percent,
        secondsLeft,
        clipId,
      ]);
      await tellClipState(unit, clip, { progress: percent, secondsLeft });
    })
      .catch((error: unknown) => {
        log.warn({ err: error }, 'progress of a clip could not be told');
      })
      .finally(() => {
        writing = false;
      });
  };
};

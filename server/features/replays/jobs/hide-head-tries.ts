import { product } from '../../../db/in-practice.ts';
import type { Ground } from '../../../main/ground.ts';
import { Replay } from '../replay.entity.ts';

/** After so many a person has to ask for the next. */
export const MOST_TRIES = 4;

/**
 * Counts one try; false where the copy was given up. One that was begun as often as may be and neither ended nor
 * failed took its worker along each time, and might take the next one as well.
 * @param replay locked by its clip, in a transaction that is committed before the work begins
 */
export const beginTry = (replay: Replay): boolean => {
  if (replay.hideFailed) return false;
  if (replay.hideTries >= MOST_TRIES) {
    replay.hideFailed = true;
    return false;
  }
  replay.hideTries += 1;
  return true;
};

/** After an error: true where that was the last try, and the link says so from now on. A worker's stop is no try. */
export const endedBadly = (
  { inPractice }: Ground,
  { id, practiceId }: Replay,
  { aborted }: AbortSignal,
): Promise<boolean> =>
  inPractice(product(practiceId), async ({ em }) => {
    const replay = await em.findOne(Replay, { id });
    if (!replay) return true;
    if (aborted) {
      replay.hideTries = Math.max(0, replay.hideTries - 1);
      return false;
    }
    replay.hideFailed = replay.hideTries >= MOST_TRIES;
    return replay.hideFailed;
  });

import { product } from '../../../db/in-practice.ts';
import { afterError, withNextTry } from '../../../jobs/tries.ts';
import type { Ground } from '../../../main/ground.ts';
import type { LinkFilm } from '../hidden-copies.ts';
import { filmById } from './film-by-id.ts';

/**
 * Counts one try; false where the copy was given up.
 * @param film locked by its clip, in a transaction that is committed before the work begins
 */
export const beginTry = (film: LinkFilm): boolean => {
  if (film.hideFailed) return false;
  const tries = withNextTry(film.hideTries);
  film.hideFailed = tries === null;
  film.hideTries = tries ?? film.hideTries;
  return tries !== null;
};

/** After an error: true where that was the last try, and the link says so from now on. */
export const endedBadly = (
  { inPractice }: Ground,
  { id, practiceId }: LinkFilm,
  signal: AbortSignal,
): Promise<boolean> =>
  inPractice(product(practiceId), async ({ em }) => {
    const film = (await filmById(em, id))?.film;
    if (!film) return true;
    const { tries, wasLast } = afterError(film.hideTries, signal);
    em.assign(film, { hideTries: tries, hideFailed: wasLast });
    return wasLast;
  });

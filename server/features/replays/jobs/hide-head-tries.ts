import { product } from '../../../db/in-practice.ts';
import type { Ground } from '../../../main/ground.ts';
import type { LinkFilm } from '../hidden-copies.ts';
import { filmById } from './film-by-id.ts';

/** After so many a person has to ask for the next. */
export const MOST_TRIES = 4;

/**
 * Counts one try; false where the copy was given up. One that was begun as often as may be and neither ended nor
 * failed took its worker along each time, and might take the next one as well.
 * @param film locked by its clip, in a transaction that is committed before the work begins
 */
export const beginTry = (film: LinkFilm): boolean => {
  if (film.hideFailed) return false;
  if (film.hideTries >= MOST_TRIES) {
    film.hideFailed = true;
    return false;
  }
  film.hideTries += 1;
  return true;
};

/** After an error: true where that was the last try, and the link says so from now on. A worker's stop is no try. */
export const endedBadly = (
  { inPractice }: Ground,
  { id, practiceId }: LinkFilm,
  { aborted }: AbortSignal,
): Promise<boolean> =>
  inPractice(product(practiceId), async ({ em }) => {
    const film = (await filmById(em, id))?.film;
    if (!film) return true;
    if (aborted) {
      film.hideTries = Math.max(0, film.hideTries - 1);
      return false;
    }
    film.hideFailed = film.hideTries >= MOST_TRIES;
    return film.hideFailed;
  });

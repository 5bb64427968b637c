import type { EntityManager } from '@mikro-orm/postgresql';
import { keptFilmKey } from '../../clips/clip-files.ts';
import type { Rep } from '../../reps/rep.entity.ts';
import type { Replay } from '../replay.entity.ts';
import { KeptFilm } from './kept-film.entity.ts';

export const filmOf = (em: EntityManager, { id }: Replay): Promise<KeptFilm | null> =>
  em.findOne(KeptFilm, { replay: id });

/**
 * Where the film of this link may lie.
 * @param replay with its rep loaded
 */
export const filmFilesOf = async (em: EntityManager, replay: Replay): Promise<string[]> => {
  const film = await filmOf(em, replay);
  return film
    ? [keptFilmKey(replay.practiceId, (replay.rep.unwrap() as Rep).clip.id, film.id)]
    : [];
};

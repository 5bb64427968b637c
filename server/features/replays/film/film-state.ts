import type { EntityManager } from '@mikro-orm/postgresql';
import type { KeptFilm as FilmShape } from '#shared/contracts/kept-film.ts';
import type { PublicReplay, Replay as ReplayShape } from '#shared/contracts/replays.ts';
import { enqueue } from '../../../jobs/job.ts';
import type { Clip } from '../../clips/clip.entity.ts';
import { hasEnded, headStateOf } from '../hidden-copies.ts';
import type { Replay } from '../replay.entity.ts';
import { MAKE_FILM } from './jobs/make-film-type.ts';
import { KeptFilm } from './kept-film.entity.ts';

/**
 * How the film of a link stands. One that was made by another version of the box counts for nothing.
 * @param head how the head of the link stands
 */
export const filmState = (
  film: KeptFilm,
  replay: Replay,
  head: ReplayShape['head'],
): FilmShape['state'] => {
  if (film.state === 'failed') return 'failed';
  if (!replay.hideHead) return film.head ? 'asked' : film.state;
  if (head !== 'hidden') return 'head-first';
  return film.head && film.head.id === replay.hiddenHead?.id ? film.state : 'asked';
};

export const presentFilm = (
  film: KeptFilm,
  replay: Replay,
  head: ReplayShape['head'],
): FilmShape => {
  const state = filmState(film, replay, head);
  const ready = state === 'ready';
  return {
    state,
    bytes: ready ? (film.bytes ?? null) : null,
    madeAt: ready ? (film.madeAt?.toISOString() ?? null) : null,
    taken: film.taken,
    lastTakenAt: film.lastTakenAt?.toISOString() ?? null,
  };
};

/** The film of a link where it may be handed over now; else null. */
export const readyFilm = async (
  em: EntityManager,
  replay: Replay,
  clip: Clip,
): Promise<KeptFilm | null> => {
  const film = await em.findOne(KeptFilm, { replay: replay.id });
  if (!film || hasEnded(replay)) return null;
  const state = filmState(film, replay, await headStateOf(em, replay, clip));
  return state === 'ready' ? film : null;
};

/** What the athlete's page says of it. */
export const filmToKeepOf = async (
  ...of: Parameters<typeof readyFilm>
): Promise<PublicReplay['film']> => {
  const film = await readyFilm(...of);
  return film?.bytes && film.madeAt
    ? { bytes: film.bytes, madeAt: film.madeAt.toISOString() }
    : null;
};

/** Asks for a film, as if it had never been tried. */
export const askForFilm = async (
  unit: { readonly em: EntityManager },
  film: KeptFilm,
): Promise<void> => {
  unit.em.assign(film, { state: 'asked', tries: 0, head: null, bytes: null, madeAt: null });
  await enqueue(unit, MAKE_FILM, { filmId: film.id });
};

/** The copy that a link's film is made of is another by now. */
export const filmIsStale = async (
  unit: { readonly em: EntityManager },
  replayId: string,
): Promise<void> => {
  const film = await unit.em.findOne(KeptFilm, { replay: replayId });
  if (film) await askForFilm(unit, film);
};

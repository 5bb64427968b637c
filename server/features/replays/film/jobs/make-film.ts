import type { EntityManager } from '@mikro-orm/postgresql';
import { burnIn } from '#server/media/burn-in.ts';
import { keptFilmLongEdge } from '#server/media/limits.ts';
import { fitEven } from '#server/media/picture-filters.ts';
import { letters } from '#server/pdf/letters.ts';
import { product } from '../../../../db/in-practice.ts';
import { handles, type JobContext } from '../../../../jobs/job.ts';
import { afterError, withNextTry } from '../../../../jobs/tries.ts';
import type { Ground } from '../../../../main/ground.ts';
import { hasConsent } from '../../../athletes/consent-check.ts';
import type { Clip } from '../../../clips/clip.entity.ts';
import { keptFilmKey } from '../../../clips/clip-files.ts';
import { lockClip } from '../../../clips/jobs/lock-clip.ts';
import type { Rep } from '../../../reps/rep.entity.ts';
import { timesOfClip } from '../../../reps/reps.presenter.ts';
import type { Visit } from '../../../visits/visit.entity.ts';
import { hasEnded, servedHidden } from '../../hidden-copies.ts';
import { contentOf, PLAYED, type Played } from '../../replay-content.ts';
import { Replay } from '../../replay.entity.ts';
import { drawFilm, GROUND } from '../draw-film.ts';
import { KeptFilm } from '../kept-film.entity.ts';
import { MAKE_FILM } from './make-film-type.ts';

/** A film that is asked for, with what it is of; null where its link has ended. The clip is locked. */
const askedFilm = async (
  em: EntityManager,
  id: string,
): Promise<(Played & { film: KeptFilm }) | null> => {
  const film = await em.findOne(KeptFilm, { id, state: 'asked' });
  const replay = film && (await em.findOne(Replay, { id: film.replay.id }, { populate: PLAYED }));
  if (!film || !replay || hasEnded(replay)) return null;
  const rep = replay.rep.unwrap() as Rep;
  const clip = rep.clip.unwrap() as Clip;
  await lockClip(em, clip.id);
  return { film, replay, rep, clip };
};

/**
 * What the film is made of, and by which version of the box its head is hidden: never the clear picture where the
 * link hides it. Null until there is such a copy.
 */
const sourceOf = async (em: EntityManager, { replay, clip }: Played) => {
  const { bench } = clip.files;
  const { width, height, copies } = clip;
  if (!bench || !width || !height || !copies)
    throw new Error('A clip that is played was prepared.');
  if (!replay.hideHead)
    return { copy: bench, head: null, size: fitEven({ width, height }, keptFilmLongEdge) };
  const hidden = await servedHidden(em, replay, clip);
  const size = { width: copies.replay.width, height: copies.replay.height };
  return hidden && { copy: hidden.replay, head: replay.hiddenHead?.id ?? null, size };
};

/** Counts a try and hands over what is to be drawn on what; null where nothing is. */
const begin = ({ inPractice }: Ground, practiceId: string, id: string) =>
  inPractice(product(practiceId), async (unit) => {
    const { em } = unit;
    const played = await askedFilm(em, id);
    if (!played) return null;
    const { film, replay, clip } = played;
    const source = await sourceOf(em, played);
    // it is asked for anew once that copy is there
    if (!source) return null;
    const athlete = (replay.visit.unwrap() as Visit).athlete.id;
    const tries = withNextTry(film.tries);
    if (tries === null || !(await hasConsent(em, athlete, 'sharing-by-link'))) {
      film.state = 'failed';
      return null;
    }
    film.tries = tries;
    const content = await contentOf(unit, played);
    return {
      ...source,
      key: keptFilmKey(practiceId, clip.id, id),
      content,
      times: timesOfClip(clip),
      perSecond: clip.frameRate?.perSecond ?? 30,
      madeAt: new Date(),
    };
  });

type Begun = NonNullable<Awaited<ReturnType<typeof begin>>>;

/** Says that the film is there; false where its link has ended, or its head is hidden by another box meanwhile. */
const keep = (
  { inPractice }: Ground,
  practiceId: string,
  id: string,
  { head, madeAt }: Begun,
  bytes: number,
) =>
  inPractice(product(practiceId), async (unit) => {
    const { em } = unit;
    const played = await askedFilm(em, id);
    if (!played || (await sourceOf(em, played))?.head !== head) return false;
    em.assign(played.film, { state: 'ready', head, bytes, madeAt });
    return true;
  });

const make = async (
  ground: Ground,
  practiceId: string,
  id: string,
  begun: Begun,
  signal: AbortSignal,
): Promise<void> => {
  const { storage } = ground;
  const { copy, key, content, times, size, perSecond, madeAt } = begun;
  const drawing = drawFilm(content, times, size, await letters(), madeAt);
  const bytes = await storage.withTempDir(async (folder) => {
    const film = await storage.withLocalFile(copy, (path) =>
      burnIn({
        ...drawing,
        copy: path,
        frames: { ...content.frames, us: [] },
        from: content.fromFrame,
        to: content.toFrame,
        ground: GROUND,
        perSecond,
        folder,
        signal,
      }),
    );
    await storage.putFile(key, film.path, 'video/mp4');
    return film.bytes;
  });
  // ended, erased or covered anew meanwhile: this one must not outlive that
  if (!(await keep(ground, practiceId, id, begun, bytes))) await storage.delete(key);
};

/** After an error: true where that was the last try, and the link says so from now on. */
const endedBadly = (
  { inPractice }: Ground,
  practiceId: string,
  id: string,
  signal: AbortSignal,
): Promise<boolean> =>
  inPractice(product(practiceId), async ({ em }) => {
    const film = (await askedFilm(em, id))?.film;
    if (!film) return true;
    const { tries, wasLast } = afterError(film.tries, signal);
    em.assign(film, { tries, ...(wasLast ? { state: 'failed' } : {}) });
    return wasLast;
  });

/** Killed at any instant it leaves at most a file that is written over; run again it makes the film anew. */
const run = async ({
  ground,
  practiceId,
  payload: { filmId },
  signal,
}: JobContext<{ filmId: string }>): Promise<void> => {
  const begun = await begin(ground, practiceId, filmId);
  if (!begun) return;
  try {
    await make(ground, practiceId, filmId, begun, signal);
  } catch (error) {
    if (!(await endedBadly(ground, practiceId, filmId, signal))) throw error;
    ground.log.error({ err: error, filmId }, 'a film to keep could not be made');
  }
};

export const makeFilmJob = handles({
  type: MAKE_FILM,
  lockKey: ({ filmId }) => filmId,
  run,
  expireInMinutes: 60,
  retryLimit: 5,
  retryDelaySeconds: 30,
  unfinished: {
    sql: 'select film_id, practice_id from films_to_make()',
    read: (row) => ({
      practiceId: String(row.practice_id),
      payload: { filmId: String(row.film_id) },
    }),
  },
});

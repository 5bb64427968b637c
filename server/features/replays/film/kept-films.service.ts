import type { LinkActor, UserActor } from '#shared/access/actors.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { found } from '../../../http/need.ts';
import { Problem } from '../../../http/problem.ts';
import { enqueue } from '../../../jobs/job.ts';
import { User } from '../../accounts/user.entity.ts';
import { needConsent } from '../../athletes/consent-check.ts';
import { audit } from '../../audit/audit.ts';
import type { Clip } from '../../clips/clip.entity.ts';
import { keptFilmKey } from '../../clips/clip-files.ts';
import type { Rep } from '../../reps/rep.entity.ts';
import { visitInSight } from '../../visits/visit-in-sight.ts';
import { hasEnded } from '../hidden-copies.ts';
import { REMOVE_HIDDEN } from '../jobs/remove-hidden-type.ts';
import { replayOfLink } from '../public-replay.ts';
import { linkInSight } from '../replays.service.ts';
import { Replay } from '../replay.entity.ts';
import { askForFilm, readyFilm } from './film-state.ts';
import { KeptFilm } from './kept-film.entity.ts';

type Of = Unit<UserActor>;

/** A file, and a name for it that says nothing of the person. */
export interface FilmFile {
  readonly key: string;
  readonly name: string;
}

/**
 * Has the film made as things stand now; while it is being made, asking again changes nothing.
 * @throws Problem 'consent-missing', 'link-gone'
 */
export const makeFilm = async (unit: Of, replayId: string): Promise<Replay> => {
  const { em, actor } = unit;
  const replay = await linkInSight(unit, replayId, 'replay.make');
  const visit = replay.visit.unwrap();
  await needConsent(em, visit.athlete.id, 'sharing-by-link');
  if (hasEnded(replay)) throw new Problem('link-gone', 'This link has ended. Make another.');
  // two who ask at once ask one after the other
  await em.execute('select 1 from replay where id = ? for update', [replayId]);
  const by = await em.findOneOrFail(User, { id: actor.id });
  const before = await em.findOne(KeptFilm, { replay: replayId });
  if (before?.state === 'asked') return replay;
  if (before) em.assign(before, { by, at: new Date() });
  else await enqueue(unit, REMOVE_HIDDEN, { replayId }, { startAfter: replay.expiresAt });
  await askForFilm(unit, before ?? em.create(KeptFilm, { replay, by }));
  audit(unit, 'replay.film', replayId, { athlete: visit.athlete.id, visit: visit.id });
  await em.flush();
  return replay;
};

const fileOf = (film: KeptFilm, replay: Replay, clip: Clip): FilmFile => ({
  key: keptFilmKey(replay.practiceId, clip.id, film.id),
  name: `${replay.visit.unwrap().day}-replay.mp4`,
});

/**
 * For staff.
 * @throws Problem 'not-as-it-stands' until it is made, and after its link has ended
 */
export const openFilm = async (unit: Of, replayId: string): Promise<FilmFile> => {
  const { em } = unit;
  const replay = found(await em.findOne(Replay, { id: replayId }, { populate: ['rep.clip'] }));
  const { athlete } = await visitInSight(unit, replay.visit.id, 'athlete.read');
  await needConsent(em, athlete.id, 'sharing-by-link');
  const clip = (replay.rep.unwrap() as Rep).clip.unwrap() as Clip;
  const film = await readyFilm(em, replay, clip);
  if (!film) throw new Problem('not-as-it-stands', 'There is no film to keep of this link.');
  audit(unit, 'replay.film-open', replayId, { athlete: athlete.id });
  return fileOf(film, replay, clip);
};

/**
 * For who holds the link; each time is counted and written down.
 * @param counts false for the rest of a file of which the beginning was counted
 * @throws Problem 'clip-not-ready' until it is made
 */
export const takeFilm = async (unit: Unit<LinkActor>, counts: boolean): Promise<FilmFile> => {
  const { em } = unit;
  const { replay, clip } = await replayOfLink(unit);
  const film = await readyFilm(em, replay, clip);
  if (!film) throw new Problem('clip-not-ready', 'There is no film to keep, or not yet.');
  if (counts) {
    await em.execute('update kept_film set taken = taken + 1, last_taken_at = now() where id = ?', [
      film.id,
    ]);
    audit(unit, 'replay.film-taken', replay.id, { athlete: replay.visit.unwrap().athlete.id });
  }
  return fileOf(film, replay, clip);
};

import type { EntityManager } from '@mikro-orm/postgresql';
import type { LinkActor } from '#shared/access/actors.ts';
import type { PublicReplay } from '#shared/contracts/replays.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { found, need } from '../../http/need.ts';
import { Problem } from '../../http/problem.ts';
import { audit } from '../audit/audit.ts';
import type { Clip } from '../clips/clip.entity.ts';
import type { Rep } from '../reps/rep.entity.ts';
import { filmToKeepOf } from './film/film-state.ts';
import { type LinkFilm, publicHeadState, servedHidden } from './hidden-copies.ts';
import { beforeOfLink } from './link-files.ts';
import { contentOf, PLAYED, type Played } from './replay-content.ts';
import { Replay } from './replay.entity.ts';

type Of = Unit<LinkActor>;

/** The replay of this link with its rep, clip and people. */
export const replayOfLink = async ({ em, actor }: Of): Promise<Played> => {
  need(actor, 'replay.open', {
    kind: 'replay',
    practiceId: actor.practiceId,
    replayId: actor.replayId,
  });
  const replay = found(await em.findOne(Replay, { id: actor.replayId }, { populate: PLAYED }));
  const rep = replay.rep.unwrap() as Rep;
  return { replay, rep, clip: rep.clip.unwrap() };
};

/**
 * Where a picture of one of a link's films lies. A link that hides the head hides it on both.
 * @throws Problem 'clip-not-ready' until there is a copy on which the head is hidden as the link promises
 */
const pictureOf = async (
  em: EntityManager,
  { film, clip, hideHead, name }: { film: LinkFilm; clip: Clip; hideHead: boolean; name: string },
  which: 'replay' | 'poster',
): Promise<string | null> => {
  if (!hideHead && !film.hideHead) return clip.files[which];
  const files = await servedHidden(em, film, clip);
  if (!files) throw new Problem('clip-not-ready', `${name} is being prepared.`);
  return files[which];
};

/**
 * Where a picture of this link lies, `before` that of the earlier lift beside it; null where it is not there.
 * @throws Problem 'clip-not-ready'
 */
export const mediaOfLink = async (
  unit: Of,
  which: 'replay' | 'poster' | 'before',
): Promise<string | null> => {
  const { em } = unit;
  const { replay, clip } = await replayOfLink(unit);
  const { hideHead } = replay;
  if (which !== 'before')
    return pictureOf(em, { film: replay, clip, hideHead, name: 'The film' }, which);
  const film = await beforeOfLink(em, replay);
  if (!film) return null;
  const earlier = (film.rep.unwrap() as Rep).clip.unwrap() as Clip;
  return pictureOf(em, { film, clip: earlier, hideHead, name: 'The earlier film' }, 'replay');
};

/** Whether there is a film to play; opens nothing and is not counted. */
export const filmOfLink = async (unit: Of): Promise<Pick<PublicReplay, 'head'>> => {
  const { replay, clip } = await replayOfLink(unit);
  return { head: await publicHeadState(unit.em, replay, clip) };
};

/** Everything that leaves by a link, and nothing else; each opening is counted and written down. */
export const openReplay = async (unit: Of): Promise<PublicReplay> => {
  const { em } = unit;
  const played = await replayOfLink(unit);
  const { replay, clip } = played;
  const content = await contentOf(unit, played);
  await em.execute(
    'update replay set openings = openings + 1, last_opened_at = now() where id = ?',
    [replay.id],
  );
  audit(unit, 'replay.open', replay.id, { athlete: replay.visit.unwrap().athlete.id });
  return { ...content, film: await filmToKeepOf(em, replay, clip) };
};

/** Writes down that somebody who has the link does not have its pass phrase. */
export const passPhraseWasWrong = async (unit: Of): Promise<void> => {
  const { em, actor } = unit;
  const replay = await em.findOneOrFail(Replay, { id: actor.replayId }, { populate: ['visit'] });
  audit(unit, 'replay.refused', replay.id, { athlete: replay.visit.unwrap().athlete.id });
};

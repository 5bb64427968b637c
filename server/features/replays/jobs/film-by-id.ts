import type { EntityManager } from '@mikro-orm/postgresql';
import { ReplayBefore } from '../before/replay-before.entity.ts';
import type { LinkFilm } from '../hidden-copies.ts';
import { Replay } from '../replay.entity.ts';

/** A film with its rep and clip, and the link that shows it. */
export interface FilmOfLink {
  readonly film: LinkFilm;
  readonly link: Replay;
}

/** The film of this id, a link's own or the earlier one beside it; null where it is gone. */
export const filmById = async (em: EntityManager, id: string): Promise<FilmOfLink | null> => {
  const populate = ['rep.clip', 'rep.clip.frames'] as const;
  const own = await em.findOne(Replay, { id }, { populate });
  if (own) return { film: own, link: own };
  const before = await em.findOne(ReplayBefore, { id }, { populate: [...populate, 'replay'] });
  return before && { film: before, link: before.replay.unwrap() };
};

import type { EntityManager } from '@mikro-orm/postgresql';
import { ReplayBefore } from './before/replay-before.entity.ts';
import { filmFilesOf } from './film/film-files.ts';
import { hiddenFilesOf } from './hidden-copies.ts';
import type { Replay } from './replay.entity.ts';

/** The earlier rep that a link shows beside its own, with its clip; null where there is none, or none any more. */
export const beforeOfLink = async (
  em: EntityManager,
  { id }: Replay,
): Promise<ReplayBefore | null> =>
  em.findOne(ReplayBefore, { replay: id }, { populate: ['rep.clip.frames', 'rep.clip.visit'] });

/**
 * All that may lie there for this link alone.
 * @param replay with its rep loaded
 */
export const filesOfLink = async (em: EntityManager, replay: Replay): Promise<string[]> => {
  const before = await beforeOfLink(em, replay);
  return [
    ...(await hiddenFilesOf(em, replay)),
    ...(before ? await hiddenFilesOf(em, before) : []),
    ...(await filmFilesOf(em, replay)),
  ];
};

import type { EntityManager } from '@mikro-orm/postgresql';
import type { HeadTrack } from '#shared/head/head-track.ts';
import { Problem } from '../../http/problem.ts';
import type { Clip } from '../clips/clip.entity.ts';
import { Head } from './head.entity.ts';

/** The version that counts; null where no box was ever drawn. */
export const currentHead = (em: EntityManager, clipId: string): Promise<Head | null> =>
  em.findOne(
    Head,
    { clip: clipId },
    { populate: ['by', 'lookedBy'], orderBy: { version: 'desc' } },
  );

/** @throws Problem 'clip-not-ready' */
export const headTrack = (head: Head, { width, height }: Clip): HeadTrack => {
  if (!width || !height) throw new Problem('clip-not-ready');
  const { fromFrame, toFrame, drawn, followed, growth } = head;
  return { width, height, fromFrame, toFrame, drawn, followed, growth };
};

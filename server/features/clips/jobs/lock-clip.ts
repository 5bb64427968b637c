import type { EntityManager } from '@mikro-orm/postgresql';

/**
 * Waits until whoever changes this clip is done, and keeps others out until this unit of work ends: what took
 * minutes to prepare is not lost to an edit of the same second.
 */
export const lockClip = async (em: EntityManager, clipId: string): Promise<void> => {
  await em.execute('select 1 from clip where id = ? for update', [clipId]);
};

import type { UserActor } from '#shared/access/actors.ts';

/**
 * The coaches whose athletes this person may see; null for all of the practice. The lists' side of `can`, which
 * a test holds against it.
 */
export const coachesInSight = (actor: UserActor): readonly string[] | null => {
  if (actor.role === 'owner') return null;
  return actor.role === 'supervisor' ? [actor.id, ...actor.coachIds] : [actor.id];
};

/** The same as a condition on a column, with its parameters: every list of athletes' data carries it. */
export const inSightSql = (
  actor: UserActor,
  coachColumn: string,
): { readonly sql: string; readonly params: readonly string[] } => {
  const coaches = coachesInSight(actor);
  return coaches === null
    ? { sql: 'true', params: [] }
    : { sql: `${coachColumn} = any (?::uuid[])`, params: [`{${coaches.join(',')}}`] };
};

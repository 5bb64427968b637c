import type { EntityManager } from '@mikro-orm/postgresql';
import type { Side } from '#shared/contracts/primitives.ts';

/** The clips of a side `s` (`visit_id`, `side`): those that hold one of its reps, or were filmed of it alone. */
export const CLIPS_OF_SIDE = `
  select c.id, c.uploaded_at from clip c
  where c.visit_id = s.visit_id and c.state = 'ready' and (c.support_side = s.side
    or exists (select from rep where rep.clip_id = c.id and rep.support_side = s.side))`;

/** How many threads on a side's clips nobody has resolved. */
export const openThreads = async (
  em: EntityManager,
  visitId: string,
  side: Side,
): Promise<number> => {
  const [row] = await em.execute<{ open: number }[]>(
    `select count(m.id)::int as open
     from (select ?::uuid as visit_id, ?::text as side) s
     join lateral (${CLIPS_OF_SIDE}) c on true
     join comment m on m.clip_id = c.id
     where m.answer_to is null and m.resolved_at is null`,
    [visitId, side],
  );
  return row?.open ?? 0;
};

import type { EntityManager } from '@mikro-orm/postgresql';

/**
 * How often a coach's first call of a side and its reading said the same, over all sides where both said something:
 * 'unsure' and 'can't tell yet' count neither way.
 */
export const agreementOf = async (
  em: EntityManager,
  coachId: string,
): Promise<{ agreed: number; of: number }> => {
  const [row] = await em.execute<{ agreed: number; of: number }[]>(
    `select count(*) filter (where (c.seen, r.code) in
          (('early', 'early-turn-out'), ('on-time', 'expected-turn-in'), ('still', 'holds-still')))::int as agreed,
        count(*)::int as of
      from (select distinct on (visit_id, side) visit_id, side, seen from call
              where by_id = ? order by visit_id, side, at) c
      join side_setting s on s.visit_id = c.visit_id and s.side = c.side
      join reading r on r.id = s.reading_id
      where c.seen <> 'unsure' and r.code in ('early-turn-out', 'expected-turn-in', 'holds-still')`,
    [coachId],
  );
  return row ?? { agreed: 0, of: 0 };
};

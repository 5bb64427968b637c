import type { EntityManager } from '@mikro-orm/postgresql';
import type { Side } from '#shared/contracts/primitives.ts';
import { enqueue } from '../../jobs/job.ts';
import { DEFAULT_ASSUMPTION } from './default-assumption.ts';
import { DERIVE_READING } from './jobs/derive-reading-type.ts';

/**
 * Says that what a side's reading rests on has changed. One job at a time is asked for, however many marks come;
 * a side without a call by eye has no reading to renew.
 */
export const readingIsStale = async (
  unit: { readonly em: EntityManager },
  visitId: string,
  side: Side,
): Promise<void> => {
  const marked = await unit.em.execute<unknown[]>(
    `insert into side_setting (id, practice_id, visit_id, side, assumption, stale)
      select gen_random_uuid(), current_practice(), ?, ?, ${DEFAULT_ASSUMPTION}, true
      where exists (select from call where visit_id = ? and side = ?)
      on conflict (visit_id, side) do update set stale = true where not side_setting.stale
      returning 1`,
    [visitId, side, visitId, side],
  );
  if (marked.length > 0) await enqueue(unit, DERIVE_READING, { visitId, side });
};

/** Both sides of a visit: what changed was the clip itself. */
export const readingsAreStale = async (
  unit: { readonly em: EntityManager },
  visitId: string,
): Promise<void> => {
  await readingIsStale(unit, visitId, 'left');
  await readingIsStale(unit, visitId, 'right');
};

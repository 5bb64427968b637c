import type { EntityManager } from '@mikro-orm/postgresql';
import type { Purpose } from '#shared/contracts/consents.ts';
import { Problem } from '../../http/problem.ts';
import { adultIfBornBy, today } from './days.ts';

/**
 * A consent `x` of an athlete `a` that counts on a day: begun, not over, not withdrawn, and of a minor only with
 * their own yes. Rows from before that was asked for lack it.
 */
export const counting = (on: string) =>
  ({
    sql: `x.withdrawn_at is null and ?::date between x.valid_from and x.valid_until
      and (x.assent or a.birth_date::text <= ?)`,
    params: [on, adultIfBornBy(on)],
  }) as const;

/** Whether a consent of this athlete allows this today. */
export const hasConsent = async (
  em: EntityManager,
  athleteId: string,
  purpose: Purpose,
): Promise<boolean> => {
  const counts = counting(today());
  const rows = await em.execute<unknown[]>(
    `select 1 from consent x join athlete a on a.id = x.athlete_id
     where a.id = ? and ${counts.sql} and ? = any (x.held) limit 1`,
    [athleteId, ...counts.params, purpose],
  );
  return rows.length > 0;
};

const MISSING: Record<Purpose, string> = {
  assessment: 'There is no valid consent to filming and assessment.',
  supervision: 'There is no valid consent to supervision.',
  teaching: 'There is no valid consent to teaching.',
  'sharing-by-link': 'There is no valid consent to sharing by a link.',
};

/** @throws Problem 'consent-missing' */
export const needConsent = async (
  em: EntityManager,
  athleteId: string,
  purpose: Purpose,
): Promise<void> => {
  if (!(await hasConsent(em, athleteId, purpose))) {
    throw new Problem('consent-missing', MISSING[purpose]);
  }
};

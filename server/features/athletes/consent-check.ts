import type { EntityManager } from '@mikro-orm/postgresql';
import type { Purpose } from '#shared/contracts/athletes.ts';
import { Problem } from '../../http/problem.ts';
import { today } from './days.ts';

/** Whether a consent of this athlete allows this today. */
export const hasConsent = async (
  em: EntityManager,
  athleteId: string,
  purpose: Purpose,
): Promise<boolean> => {
  const rows = await em.execute<unknown[]>(
    `select 1 from consent where athlete_id = ? and withdrawn_at is null
     and ?::date between valid_from and valid_until and ? = any (purposes) limit 1`,
    [athleteId, today(), purpose],
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

import type { EntityManager } from '@mikro-orm/postgresql';
import type { LastSafety } from '#shared/contracts/plans.ts';
import type { SafetyState } from '#shared/plan/held-back.ts';
import { Visit } from '../visits/visit.entity.ts';

/** The athlete's last safety check, on whichever visit it was; null where none was ever asked. */
export const lastSafetyOf = async (
  em: EntityManager,
  athleteId: string,
): Promise<LastSafety | null> => {
  const visit = await em.findOne(
    Visit,
    { athlete: athleteId, safety: { $ne: null } },
    { orderBy: { day: 'desc', createdAt: 'desc', id: 'desc' } },
  );
  if (!visit?.safety) return null;
  const { answers, clearedBy } = visit.safety;
  return { visitId: visit.id, day: visit.day, answers, clearedBy };
};

export const stateOf = (safety: LastSafety | null): SafetyState => ({
  answers: safety?.answers ?? null,
  clearedBy: safety?.clearedBy ?? null,
});

import type * as z from 'zod';
import type { UserActor } from '#shared/access/actors.ts';
import type { setUpBody } from '#shared/contracts/visits.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { found, need } from '../../http/need.ts';
import { User } from '../accounts/user.entity.ts';
import { audit } from '../audit/audit.ts';
import { SetUp } from './set-up.entity.ts';
import type { Filming } from './visit.entity.ts';

/** The figures of a set-up as a visit keeps them. */
export const filmingOf = (setUp: SetUp): Filming => ({
  distanceMm: setUp.distanceMm,
  lensHeightMm: setUp.lensHeightMm ?? null,
  rodMm: setUp.rodMm ?? null,
  beltPointerMm: setUp.beltPointerMm ?? null,
  thighPointerMm: setUp.thighPointerMm ?? null,
});

const ofPractice = ({ practiceId }: UserActor) => ({ kind: 'practice', practiceId }) as const;

/** Last used first; those never used by name. */
export const listSetUps = ({ em, actor }: Unit<UserActor>): Promise<SetUp[]> => {
  need(actor, 'practice.read', ofPractice(actor));
  return em.find(SetUp, {}, { orderBy: [{ lastUsed: 'desc nulls last' }, { name: 'asc' }] });
};

export const addSetUp = async (
  unit: Unit<UserActor>,
  given: z.infer<typeof setUpBody>,
): Promise<SetUp> => {
  const { em, actor } = unit;
  need(actor, 'set-up.save', ofPractice(actor));
  const setUp = em.create(SetUp, { ...given, savedBy: em.getReference(User, actor.id) });
  audit(unit, 'set-up.save', setUp.id);
  await em.flush();
  return setUp;
};

/** Visits filmed with it keep their figures. */
export const deleteSetUp = async (unit: Unit<UserActor>, id: string): Promise<void> => {
  const { em, actor } = unit;
  const setUp = found(await em.findOne(SetUp, { id }));
  need(actor, 'set-up.delete', ofPractice(actor));
  em.remove(setUp);
  audit(unit, 'set-up.delete', id);
  await em.flush();
};

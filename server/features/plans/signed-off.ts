import type { EntityManager } from '@mikro-orm/postgresql';
import type { SignedOff } from '#shared/contracts/plans.ts';
import type { Side } from '#shared/contracts/primitives.ts';
import { presentPerson } from '../accounts/accounts.presenter.ts';
import { SideReview } from '../reviews/side-review.entity.ts';

/** Who signed off a reading or a call by eye of one side, by its id; null for everything else of that side. */
export const signOffsOf = async (
  em: EntityManager,
  visitId: string,
  side: Side,
): Promise<(id: string | undefined) => SignedOff | null> => {
  const stands = await em.findOne(SideReview, { visit: visitId, side }, { populate: ['last.by'] });
  const last = stands?.last.unwrap();
  const about = last?.reading?.id ?? last?.call?.id;
  if (!last || last.step !== 'signed-off') return () => null;
  const signedOff = { by: presentPerson(last.by.unwrap()), at: last.at.toISOString() };
  return (id) => (id !== undefined && id === about ? signedOff : null);
};

import type { Erasure as Shape } from '#shared/contracts/retention.ts';
import { presentPerson } from '../accounts/accounts.presenter.ts';
import type { Erasure } from './erasure.entity.ts';

/** @param erasure with `askedBy` loaded */
export const presentErasure = (erasure: Erasure): Shape => ({
  id: erasure.id,
  athleteId: erasure.athleteId,
  why: erasure.why,
  askedBy: erasure.askedBy ? presentPerson(erasure.askedBy.unwrap()) : null,
  askedAt: erasure.askedAt.toISOString(),
  visits: erasure.visits,
  clips: erasure.clips,
  bytes: erasure.bytes,
  doneAt: erasure.doneAt?.toISOString() ?? null,
});

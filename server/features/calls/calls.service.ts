import type * as z from 'zod';
import type { UserActor } from '#shared/access/actors.ts';
import type { callBody } from '#shared/contracts/calls.ts';
import type { Side } from '#shared/contracts/primitives.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { User } from '../accounts/user.entity.ts';
import { audit } from '../audit/audit.ts';
import { currentProtocol } from '../protocol/current-protocol.ts';
import { SideSetting } from '../readings/side-setting.entity.ts';
import { readingIsStale } from '../readings/stale.ts';
import { visitInSight } from '../visits/visit-in-sight.ts';
import { Call } from './call.entity.ts';

/** Oldest first. */
export const listCalls = async (
  unit: Unit<UserActor>,
  visitId: string,
  side: Side,
): Promise<Call[]> => {
  await visitInSight(unit, visitId, 'athlete.read');
  return unit.em.find(
    Call,
    { visit: visitId, side },
    { orderBy: { at: 'asc', id: 'asc' }, populate: ['by'] },
  );
};

/** Keeps a call beside those that are there. It knows whether a figure of this side had been shown before. */
export const recordCall = async (
  unit: Unit<UserActor>,
  visitId: string,
  side: Side,
  given: z.infer<typeof callBody>,
): Promise<Call> => {
  const { em, actor } = unit;
  const { visit, athlete } = await visitInSight(unit, visitId, 'call.record');
  const setting = await em.findOne(SideSetting, { visit: visitId, side });
  const { gateFrom, gateTo } = (await currentProtocol(em)).values;
  const call = em.create(Call, {
    ...given,
    gateFrom,
    gateTo,
    substitutions: [...new Set(given.substitutions)],
    visit,
    side,
    by: await em.findOneOrFail(User, { id: actor.id }),
    beforeFigures: !setting?.figuresShownAt,
  });
  audit(unit, 'call.record', call.id, { athlete: athlete.id, visit: visitId, side });
  await em.flush();
  await readingIsStale(unit, visitId, side);
  return call;
};

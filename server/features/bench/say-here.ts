import type { UserActor } from '#shared/access/actors.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { tell } from '#server/events/tell.ts';
import { presentPerson } from '../accounts/accounts.presenter.ts';
import { clipInSight } from '../clips/clip-in-sight.ts';

/**
 * Tells the tabs of those who may see the clip that this person has it open or has left it. Nothing is stored: a tab
 * that stops saying so is forgotten by the others.
 * @throws Problem 'not-found'
 */
export const sayHere = async (
  unit: Unit<UserActor>,
  clipId: string,
  by: { readonly id: string; readonly name: string },
  here: boolean,
): Promise<void> => {
  const { athlete } = await clipInSight(unit, clipId, 'athlete.read');
  const scope = { coachId: athlete.coach.id };
  await tell(unit, scope, { type: 'here', clipId, by: presentPerson(by), here });
};

import { type Action, type Resource, SEEING } from '#shared/access/actions.ts';
import type { Actor } from '#shared/access/actors.ts';
import { can } from '#shared/access/can.ts';
import { Problem } from './problem.ts';

/**
 * Goes on only where the actor may. What they may not even see answers like what does not exist.
 * @throws Problem 'not-found' or 'not-allowed'
 */
export const need = (actor: Actor, action: Action, resource: Resource): void => {
  if (can(actor, action, resource)) return;
  throw new Problem(can(actor, SEEING[resource.kind], resource) ? 'not-allowed' : 'not-found');
};

/** The same, said of an athlete by their coach; works for every entity that knows its athlete. */
export const needCaseload = (
  actor: Actor,
  action: Action,
  athlete: { readonly practiceId: string; readonly coach: { readonly id: string } },
): void =>
  need(actor, action, {
    kind: 'caseload',
    practiceId: athlete.practiceId,
    coachId: athlete.coach.id,
  });

/** What was looked for, or `not-found`. */
export const found = <T>(thing: T | null | undefined): T => {
  if (thing === null || thing === undefined) throw new Problem('not-found');
  return thing;
};

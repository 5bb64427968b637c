import { type Action, type Resource, SEEING } from '#shared/access/actions.ts';
import type { Actor } from '#shared/access/actors.ts';
import { can } from '#shared/access/can.ts';
import { Problem } from './problem.ts';

/** What somebody asked for that is not theirs; the audit trail keeps it. */
export class Refusal extends Problem {
  readonly tried: Action;
  /** Of the practice's athlete concerned, where there is one. */
  readonly athleteId: string | null;

  constructor(code: 'not-allowed' | 'not-found', tried: Action, athleteId: string | null) {
    super(code);
    this.tried = tried;
    this.athleteId = athleteId;
  }
}

/**
 * Goes on only where the actor may. What they may not even see answers like what does not exist.
 * @throws Problem 'not-found' or 'not-allowed'
 */
export const need = (
  actor: Actor,
  action: Action,
  resource: Resource,
  athleteId: string | null = null,
): void => {
  if (can(actor, action, resource)) return;
  const seen = can(actor, SEEING[resource.kind], resource);
  throw new Refusal(seen ? 'not-allowed' : 'not-found', action, athleteId);
};

/** An athlete, as far as it matters to who may do what. */
interface OfCoach {
  readonly practiceId: string;
  readonly coach: { readonly id: string };
}

/** The caseload that an athlete belongs to, for `can`. */
export const caseloadOf = ({ practiceId, coach }: OfCoach) =>
  ({ kind: 'caseload', practiceId, coachId: coach.id }) as const satisfies Resource;

/** The same, said of an athlete by their coach; works for every entity that knows its athlete. */
export const needCaseload = (
  actor: Actor,
  action: Action,
  athlete: OfCoach & { readonly id: string },
): void => need(actor, action, caseloadOf(athlete), athlete.id);

/** What was looked for, or `not-found`. */
export const found = <T>(thing: T | null | undefined): T => {
  if (thing === null || thing === undefined) throw new Problem('not-found');
  return thing;
};

import type { UserActor } from '#shared/access/actors.ts';
import type * as z from 'zod';
import type { waiting } from '#shared/contracts/today.ts';

export type WaitingItem = z.infer<typeof waiting>;

/** Of each kind; a list that nobody reads to its end. */
export const AT_MOST = 100;

/** Every query names the athlete and the moment so. */
export type Named = { athlete_id: string; athlete_name: string; at: Date | string };

export const ATHLETE = `a.id as athlete_id, a.given_name || ' ' || a.family_name as athlete_name`;

export const whoAndWhen = ({ athlete_id, athlete_name, at }: Named) => ({
  athlete: { id: athlete_id, name: athlete_name },
  at: new Date(at).toISOString(),
});

/** A condition on the athlete `a`: those this person works with by their own hand. */
export const ownAthletes = (actor: UserActor) =>
  ({ sql: 'a.coach_id = ?', params: [actor.id] }) as const;

/** Those of them whose clips may be opened. */
export const ownOpenAthletes = (actor: UserActor) =>
  ({ sql: 'a.coach_id = ? and a.deletion_due is null', params: [actor.id] }) as const;

/** An owner answers for the whole practice where consents and links are concerned. */
export const answeredFor = (actor: UserActor) =>
  actor.role === 'owner' ? ({ sql: 'true', params: [] } as const) : ownAthletes(actor);

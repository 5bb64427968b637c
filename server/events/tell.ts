import { randomUUID } from 'node:crypto';
import type { EntityManager } from '@mikro-orm/postgresql';
import type * as z from 'zod';
import type { liveEvent } from '#shared/contracts/events.ts';

export type LiveEvent = z.infer<typeof liveEvent>;

/** The channel of NOTIFY that every web process listens to. */
export const EVENT_CHANNEL = 'redshank_events';

/** Whom an event is for: everybody who may see this coach's athletes, one user's tabs, or one session's. */
export type EventScope =
  { readonly coachId: string } | { readonly userId: string } | { readonly sessionId: string };

export interface ToldEvent {
  readonly id: string;
  readonly practiceId: string;
  readonly scope: EventScope;
  readonly event: LiveEvent;
}

/**
 * Tells the tabs that something changed. Goes out when the unit of work commits, and not at all if it fails.
 * @param scope the athlete's coach, whose caseload decides who may be told
 */
export const tell = async (
  unit: { readonly em: EntityManager; readonly actor: { readonly practiceId: string } },
  scope: EventScope,
  event: LiveEvent,
): Promise<void> => {
  const told: ToldEvent = { id: randomUUID(), practiceId: unit.actor.practiceId, scope, event };
  await unit.em.execute('select pg_notify(?, ?)', [EVENT_CHANNEL, JSON.stringify(told)]);
};

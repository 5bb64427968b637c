import { randomUUID } from 'node:crypto';
import type { EntityManager } from '@mikro-orm/postgresql';
import type * as z from 'zod';
import type { liveEvent } from '#shared/contracts/events.ts';

export type LiveEvent = z.infer<typeof liveEvent>;

/** The channel of NOTIFY that every web process listens to. */
export const EVENT_CHANNEL = 'redshank_events';

/**
 * Whom an event is for: everybody who may see this coach's athletes, one user's tabs, or one session's.
 * `supervised`: an assigned supervisor hears it too.
 */
export type EventScope =
  | { readonly coachId: string; readonly supervised?: boolean }
  | { readonly userId: string }
  | { readonly sessionId: string };

export interface ToldEvent {
  readonly id: string;
  readonly practiceId: string;
  readonly scope: EventScope;
  readonly event: LiveEvent;
}

/** What was filmed of whom; null where the event is not about that. */
const filmed = (event: LiveEvent): { readonly sql: string; readonly id: string } | null => {
  if ('visitId' in event) return { sql: 'v.id = ?', id: event.visitId };
  return 'clipId' in event
    ? { sql: 'v.id = (select visit_id from clip where id = ?)', id: event.clipId }
    : null;
};

/** Who hears of what was filmed: nobody once filming is withdrawn, no supervisor without consent to supervision. */
const openTo = async (
  { em }: { readonly em: EntityManager },
  scope: { readonly coachId: string },
  event: LiveEvent,
): Promise<EventScope | null> => {
  const which = filmed(event);
  if (which === null) return { ...scope, supervised: true };
  const [row] = await em.execute<{ closed: boolean; supervised: boolean }[]>(
    `select a.deletion_due is not null as closed, exists (
       select from consent c where c.athlete_id = a.id and c.withdrawn_at is null
         and (now() at time zone 'utc')::date between c.valid_from and c.valid_until
         and 'supervision' = any (c.held)
     ) as supervised
     from visit v join athlete a on a.id = v.athlete_id where ${which.sql}`,
    [which.id],
  );
  return row?.closed ? null : { ...scope, supervised: row?.supervised === true };
};

/**
 * Tells the tabs that something changed. Goes out when the unit of work commits, and not at all if it fails.
 * @param scope the athlete's coach, whose caseload decides who may be told
 */
export const tell = async (
  unit: { readonly em: EntityManager; readonly actor: { readonly practiceId: string } },
  scope: EventScope,
  event: LiveEvent,
): Promise<void> => {
  const heard = 'coachId' in scope ? await openTo(unit, scope, event) : scope;
  if (heard === null) return;
  const { practiceId } = unit.actor;
  const told: ToldEvent = { id: randomUUID(), practiceId, scope: heard, event };
  await unit.em.execute('select pg_notify(?, ?)', [EVENT_CHANNEL, JSON.stringify(told)]);
};

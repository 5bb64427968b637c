import type { EntityManager } from '@mikro-orm/postgresql';
import type { Role } from '#shared/access/actors.ts';
import type { AUDIT_ACTIONS } from '#shared/contracts/audit-actions.ts';
import { type AuditDetail, type AuditedAction } from '#shared/contracts/audit-actions.ts';
import { askerNow } from '../../http/asker.ts';
import { AuditEntry } from './audit-entry.entity.ts';

/** Who did it: a user by id, a replay link, the product itself, or somebody whom nothing identifies. */
export type Doer =
  | { readonly kind: 'user'; readonly id: string; readonly role: Role }
  | { readonly kind: 'link' | 'product' | 'nobody' };

interface Act {
  readonly em: EntityManager;
  readonly actor: Doer;
}

/** What is done to an athlete names them. */
export type About<A extends AuditedAction> = (typeof AUDIT_ACTIONS)[A][0] extends 'athlete'
  ? [about: AuditDetail & { readonly athlete: string }]
  : [about?: AuditDetail & { readonly athlete?: string | null }];

const UUID = /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/;
/** One or more codes. A name begins with a capital. */
const CODES = /^[a-z][\w.-]*( [a-z][\w.-]*)*$/;

/** Nothing that a person wrote comes in, not even by mistake. */
const needCodes = (detail: AuditDetail): void => {
  for (const [key, value] of Object.entries(detail))
    if (typeof value === 'string' && value !== '' && !UUID.test(value) && !CODES.test(value))
      throw new Error(`The audit trail takes ids, codes and counts, which '${key}' is not.`);
};

const rowOf = (
  actor: Doer,
  action: AuditedAction,
  subjectId: string,
  { athlete = null, ...detail }: AuditDetail & { readonly athlete?: string | null },
) => {
  needCodes(detail);
  const asker = askerNow();
  return {
    actor: actor.kind,
    byUser: actor.kind === 'user' ? actor.id : null,
    role: actor.kind === 'user' ? actor.role : null,
    action,
    athleteId: athlete,
    subject: action.split('.')[0] ?? action,
    subjectId,
    detail: Object.keys(detail).length === 0 ? null : detail,
    sessionId: asker?.sessionId ?? null,
    requestId: asker?.requestId ?? null,
    network: asker?.network ?? null,
  };
};

/**
 * Writes down who did what, in the same transaction as what was done.
 * @param subjectId of the row it was done to; its kind is the first word of the action
 */
export const audit = <A extends AuditedAction>(
  { em, actor }: Act,
  action: A,
  subjectId: string,
  ...[about = {}]: About<A>
): void => {
  em.create(AuditEntry, { ...rowOf(actor, action, subjectId, about), onceKey: null });
};

/** The same, once for a thing in a session: looking at a clip is many requests, marking a rep many commands. */
export const auditOnce = async <A extends AuditedAction>(
  { em, actor }: Act,
  action: A,
  subjectId: string,
  ...[about = {}]: About<A>
): Promise<void> => {
  const row = rowOf(actor, action, subjectId, about);
  const onceKey = row.sessionId && `${row.sessionId} ${action} ${subjectId}`;
  await em.execute(
    `insert into audit_entry (id, practice_id, at, actor, by_user, role, action, athlete_id, subject, subject_id,
        detail, session_id, request_id, network, once_key)
      values (gen_random_uuid(), current_practice(), now(), ?, ?, ?, ?, ?, ?, ?, ?::jsonb, ?, ?, ?, ?)
      on conflict (once_key) do nothing`,
    [
      ...[row.actor, row.byUser, row.role, row.action, row.athleteId, row.subject, row.subjectId],
      row.detail && JSON.stringify(row.detail),
      ...[row.sessionId, row.requestId, row.network, onceKey],
    ],
  );
};

import type { EntityManager } from '@mikro-orm/postgresql';
import { AuditEntry } from './audit-entry.entity.ts';

/** What is written down, by what it was done to. */
export type AuditedAction =
  | 'account.sign-in'
  | 'athlete.add'
  | 'athlete.edit'
  | 'consent.record'
  | 'consent.withdraw'
  | 'visit.add'
  | 'visit.safety'
  | 'visit.export'
  | 'set-up.save'
  | 'set-up.delete'
  | 'protocol.change'
  | 'call.record'
  | 'clip.upload'
  | 'clip.delete'
  | 'clip.export'
  | 'rep.delete'
  | 'rep.export'
  | 'reading.assume'
  | 'reading.renew'
  | 'second-marking.start'
  | 'second-marking.finish'
  | 'second-marking.discard'
  | 'comment.delete'
  | 'head.save'
  | 'head.look'
  | 'replay.make'
  | 'replay.revoke'
  | 'replay.open';

/** Who did it: a user by id, a replay link, or the product itself. */
type Doer = { readonly kind: 'user'; readonly id: string } | { readonly kind: 'link' | 'product' };

/**
 * Writes down who did what, in the same transaction as what was done.
 * @param subjectId of the row it was done to; its kind is the first word of the action
 * @param detail ids, codes and counts; never a name, a password or a token
 */
export const audit = (
  { em, actor }: { readonly em: EntityManager; readonly actor: Doer },
  action: AuditedAction,
  subjectId: string,
  detail: Record<string, string | number | boolean | null> | null = null,
): void => {
  em.create(AuditEntry, {
    actor: actor.kind,
    byUser: actor.kind === 'user' ? actor.id : null,
    action,
    subject: action.split('.')[0] ?? action,
    subjectId,
    detail,
  });
};

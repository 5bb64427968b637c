import { defineEntity, type InferEntity, p } from '@mikro-orm/core';
import { role } from '#shared/contracts/accounts.ts';
import type { AuditDetail } from '#shared/contracts/audit-actions.ts';
import { madeAt, ownedRow } from '#server/db/columns.ts';

/** One thing that somebody did. Triggers refuse to change or delete it. */
export const AuditEntry = defineEntity({
  name: 'AuditEntry',
  indexes: [
    { properties: ['practiceId', 'at'] },
    { properties: ['practiceId', 'athleteId', 'at'] },
    { properties: ['practiceId', 'byUser', 'at'] },
  ],
  properties: {
    ...ownedRow(),
    at: madeAt(),
    /** A user's id; null where a link, the product itself or nobody known acted. */
    byUser: p.uuid().nullable(),
    actor: p.enum(['user', 'link', 'product', 'nobody']),
    /** What the user was then. */
    role: p.enum(role.options).nullable(),
    /** What was done, such as `consent.withdraw`. */
    action: p.text(),
    /** Whom it concerns. No foreign key: the entry stays when the athlete is gone. */
    athleteId: p.uuid().nullable(),
    subject: p.text(),
    subjectId: p.uuid(),
    /** Ids, codes and counts; never a name, a password or a token. */
    detail: p.json<AuditDetail>().nullable(),
    sessionId: p.uuid().nullable(),
    requestId: p.text().nullable(),
    /** The network that it was asked from, not the device. */
    network: p.text().nullable(),
    /** Names what is written down once and no more, such as the first look at a clip in a session. */
    onceKey: p.text().nullable().unique(),
  },
});
export type AuditEntry = InferEntity<typeof AuditEntry>;

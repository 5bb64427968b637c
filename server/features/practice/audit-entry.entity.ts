import { defineEntity, type InferEntity, p } from '@mikro-orm/core';
import { madeAt, ownedRow } from '#server/db/columns.ts';

/** One thing that somebody did. A trigger refuses to change or delete it. */
export const AuditEntry = defineEntity({
  name: 'AuditEntry',
  indexes: [{ properties: ['practiceId', 'at'] }],
  properties: {
    ...ownedRow(),
    at: madeAt(),
    /** A user's id; null where a link or the product itself acted. */
    byUser: p.uuid().nullable(),
    actor: p.enum(['user', 'link', 'product']),
    /** What was done, such as `consent.withdraw`. */
    action: p.text(),
    subject: p.text(),
    subjectId: p.uuid(),
    /** Ids, codes and counts; never a name, a password or a token. */
    detail: p.json<Record<string, string | number | boolean | null>>().nullable(),
  },
});
export type AuditEntry = InferEntity<typeof AuditEntry>;

import { defineEntity, type InferEntity, p } from '@mikro-orm/core';
import { madeAt, moment, ownedRow } from '#server/db/columns.ts';
import { User } from './user.entity.ts';

/** One sign-in on one device. The cookie only points here; this row decides. */
export const Session = defineEntity({
  name: 'Session',
  properties: {
    ...ownedRow(),
    user: p.manyToOne(User).ref(),
    /** Browser and system in words, from the user agent; enough to tell one's own devices apart. */
    device: p.text(),
    createdAt: madeAt(),
    lastSeenAt: madeAt(),
    expiresAt: moment(),
    revokedAt: moment().nullable(),
  },
});
export type Session = InferEntity<typeof Session>;

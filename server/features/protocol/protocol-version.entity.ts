import { defineEntity, type InferEntity, p } from '@mikro-orm/core';
import type { Protocol } from '#shared/protocol/protocol.ts';
import { madeAt, ownedRow } from '#server/db/columns.ts';
import { User } from '../accounts/user.entity.ts';

/** One version of a practice's protocol. A trigger refuses to change or delete it; the first comes with the practice. */
export const ProtocolVersion = defineEntity({
  name: 'ProtocolVersion',
  uniques: [{ properties: ['practiceId', 'version'] }],
  properties: {
    ...ownedRow(),
    version: p.integer(),
    values: p.json<Protocol>(),
    /** Null: it came with the practice. */
    by: p.manyToOne(User).ref().nullable(),
    at: madeAt(),
    /** Why it was changed. */
    note: p.text(),
  },
});
export type ProtocolVersion = InferEntity<typeof ProtocolVersion>;

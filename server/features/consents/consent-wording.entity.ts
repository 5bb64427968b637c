import { defineEntity, type InferEntity, p } from '@mikro-orm/core';
import type { WordingTexts } from '#shared/contracts/consents.ts';
import { madeAt, ownedRow } from '#server/db/columns.ts';
import { User } from '../accounts/user.entity.ts';

/** One version of what a practice reads out when it asks for consent. A trigger refuses to change or delete it. */
export const ConsentWording = defineEntity({
  name: 'ConsentWording',
  uniques: [{ properties: ['practiceId', 'version'] }],
  properties: {
    ...ownedRow(),
    version: p.integer(),
    texts: p.json<WordingTexts>(),
    /** Null: it came with the practice. */
    by: p.manyToOne(User).ref().nullable(),
    at: madeAt(),
    /** Why it was changed. */
    note: p.text(),
  },
});
export type ConsentWording = InferEntity<typeof ConsentWording>;

import { defineEntity, type InferEntity, p } from '@mikro-orm/core';
import { madeAt, ownedRow, real } from '#server/db/columns.ts';
import { User } from '../accounts/user.entity.ts';

/** The person filmed. `coach` decides who may see them and all that hangs on them. */
export const Athlete = defineEntity({
  name: 'Athlete',
  indexes: [{ properties: ['practiceId', 'familyName', 'givenName'] }],
  properties: {
    ...ownedRow(),
    coach: p.manyToOne(User).ref(),
    givenName: p.text(),
    familyName: p.text(),
    birthDate: p.date(),
    heightMm: real().nullable(),
    sport: p.text().default(''),
    cautions: p.text().default(''),
    contactEmail: p.text().nullable(),
    /**
     * Set by the withdrawal of the consent to filming: what was filmed is closed, and goes on this day. A new consent
     * takes it back.
     */
    deletionDue: p.date().nullable(),
    createdAt: madeAt(),
    version: p.integer().version(),
  },
});
export type Athlete = InferEntity<typeof Athlete>;

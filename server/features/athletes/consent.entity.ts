import { defineEntity, type InferEntity, p } from '@mikro-orm/core';
import type { Purpose } from '#shared/contracts/athletes.ts';
import { madeAt, moment, ownedRow } from '#server/db/columns.ts';
import { User } from '../accounts/user.entity.ts';
import { Athlete } from './athlete.entity.ts';

/** A consent as it was given. It is withdrawn, never changed. */
export const Consent = defineEntity({
  name: 'Consent',
  properties: {
    ...ownedRow(),
    athlete: p.manyToOne(Athlete).ref(),
    givenBy: p.enum(['athlete', 'guardian']),
    guardianName: p.text().nullable(),
    guardianRelation: p.text().nullable(),
    assent: p.boolean(),
    purposes: p.array<Purpose>((value) => value as Purpose),
    /** First and last day, both inclusive. */
    validFrom: p.date(),
    validUntil: p.date(),
    how: p.text(),
    recordedBy: p.manyToOne(User).ref(),
    recordedAt: madeAt(),
    withdrawnAt: moment().nullable(),
    withdrawnBy: p.manyToOne(User).ref().nullable(),
  },
});
export type Consent = InferEntity<typeof Consent>;

import { defineEntity, type InferEntity, p } from '@mikro-orm/core';
import type { Purpose } from '#shared/contracts/consents.ts';
import type { ScanType } from '#shared/contracts/consents.ts';
import { madeAt, moment, ownedRow } from '#server/db/columns.ts';
import { User } from '../accounts/user.entity.ts';
import { ConsentWording } from '../consents/consent-wording.entity.ts';
import { Athlete } from './athlete.entity.ts';

/** One purpose that was taken back. */
export type Withdrawal = { purpose: Purpose; at: string; byId: string };

/** The paper, as a file beside the consent; where it lies follows from the consent's id. */
export type Scan = { type: ScanType; bytes: number; at: string; byId: string };

/** A consent as it was given. Its purposes are withdrawn one by one; what was given never changes. */
export const Consent = defineEntity({
  name: 'Consent',
  properties: {
    ...ownedRow(),
    athlete: p.manyToOne(Athlete).ref(),
    givenBy: p.enum(['athlete', 'guardian']),
    guardianName: p.text().nullable(),
    guardianRelation: p.text().nullable(),
    assent: p.boolean(),
    /** What was agreed to. */
    purposes: p.array<Purpose>((value) => value as Purpose),
    /** What of it still holds. */
    held: p.array<Purpose>((value) => value as Purpose),
    withdrawals: p.json<Withdrawal[]>().onCreate(() => []),
    /** What was read out or shown; null: not known. */
    wording: p.manyToOne(ConsentWording).ref().nullable(),
    scan: p.json<Scan>().nullable(),
    /** First and last day, both inclusive. */
    validFrom: p.date(),
    validUntil: p.date(),
    how: p.text(),
    recordedBy: p.manyToOne(User).ref(),
    recordedAt: madeAt(),
    /** Since when nothing of it holds. */
    withdrawnAt: moment().nullable(),
    withdrawnBy: p.manyToOne(User).ref().nullable(),
  },
});
export type Consent = InferEntity<typeof Consent>;

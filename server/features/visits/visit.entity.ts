import { defineEntity, type InferEntity, p } from '@mikro-orm/core';
import type * as z from 'zod';
import type { filming, SafetyQuestion } from '#shared/contracts/visits.ts';
import { madeAt, ownedRow } from '#server/db/columns.ts';
import { User } from '../accounts/user.entity.ts';
import { Athlete } from '../athletes/athlete.entity.ts';

export type Filming = z.infer<typeof filming>;

/** The safety check as it was answered; kept with the visit. */
export type SafetyAnswers = {
  answers: Record<SafetyQuestion, boolean>;
  chaperone: boolean | null;
  clearedBy: string | null;
  askedBy: { id: string; name: string };
  /** ISO 8601. */
  askedAt: string;
};

/** One day's testing of one athlete. `coach` is who opened it. */
export const Visit = defineEntity({
  name: 'Visit',
  properties: {
    ...ownedRow(),
    athlete: p.manyToOne(Athlete).ref(),
    coach: p.manyToOne(User).ref(),
    day: p.date(),
    note: p.text(),
    safety: p.json<SafetyAnswers>().nullable(),
    filming: p.json<Filming>(),
    setUpName: p.text().nullable(),
    createdAt: madeAt(),
    version: p.integer().version(),
  },
});
export type Visit = InferEntity<typeof Visit>;

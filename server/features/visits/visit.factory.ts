import type { EntityManager } from '@mikro-orm/postgresql';
import { SAFETY_QUESTIONS } from '#shared/contracts/visits.ts';
import type { User } from '../accounts/user.entity.ts';
import type { Athlete } from '../athletes/athlete.entity.ts';
import { type Filming, type SafetyAnswers, Visit } from './visit.entity.ts';

/** Every question answered with no: filming may go on. */
export const wellAndReady = (askedBy: { id: string; name: string }): SafetyAnswers => ({
  answers: Object.fromEntries(
    SAFETY_QUESTIONS.map((question) => [question, false]),
  ) as SafetyAnswers['answers'],
  chaperone: null,
  clearedBy: null,
  askedBy: { id: askedBy.id, name: askedBy.name },
  askedAt: new Date().toISOString(),
});

export const FILMED_IN_THE_HALL: Filming = {
  distanceMm: 3000,
  lensHeightMm: 950,
  rodMm: 1000,
  beltPointerMm: 150,
  thighPointerMm: 120,
};

/** A visit of today whose safety check is done. */
export const makeVisit = (
  em: EntityManager,
  given: {
    athlete: Athlete;
    coach: User;
    day?: string;
    note?: string;
    safety?: SafetyAnswers | null;
    filming?: Filming;
    setUpName?: string;
  },
): Visit =>
  em.create(Visit, {
    day: new Date().toISOString().slice(0, 10),
    note: '',
    safety: wellAndReady(given.coach),
    filming: FILMED_IN_THE_HALL,
    ...given,
  });

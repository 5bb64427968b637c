import type { EntityManager } from '@mikro-orm/postgresql';
import { SAFETY_QUESTIONS } from '#shared/contracts/visits.ts';
import type { User } from '../../features/accounts/user.entity.ts';
import { Athlete } from '../../features/athletes/athlete.entity.ts';
import { Consent } from '../../features/athletes/consent.entity.ts';
import { daysLater, today } from '../../features/athletes/days.ts';
import { Call } from '../../features/calls/call.entity.ts';
import { type SafetyAnswers, Visit } from '../../features/visits/visit.entity.ts';
import { storyId } from './story-id.ts';
import { type AthleteStory, placesOf, type VisitStory } from './story.ts';

const NOT_MEASURED_YET = {
  distanceMm: null,
  lensHeightMm: null,
  rodMm: null,
  beltPointerMm: null,
  thighPointerMm: null,
};

/** A time on that day at which people work. */
export const hourOf = (daysAgo: number, hour: number): Date =>
  new Date(Date.parse(`${daysLater(today(), -daysAgo)}T00:00:00Z`) + hour * 3_600_000);

const allWell = (coach: User, minor: boolean, daysAgo: number): SafetyAnswers => ({
  answers: Object.fromEntries(
    SAFETY_QUESTIONS.map((question) => [question, false]),
  ) as SafetyAnswers['answers'],
  chaperone: minor ? true : null,
  clearedBy: null,
  askedBy: { id: coach.id, name: coach.name },
  askedAt: hourOf(daysAgo, 8).toISOString(),
});

const seedVisit = (
  em: EntityManager,
  practiceId: string,
  coach: User,
  [athlete, story]: readonly [Athlete, AthleteStory],
  visit: VisitStory,
): void => {
  const row = em.create(Visit, {
    id: storyId(practiceId, ...placesOf(story, visit)),
    athlete,
    coach,
    day: daysLater(today(), -visit.daysAgo),
    note: visit.note ?? '',
    safety: allWell(coach, story.age < 18, visit.daysAgo),
    filming: NOT_MEASURED_YET,
    createdAt: hourOf(visit.daysAgo, 8),
  });
  for (const call of visit.calls) {
    em.create(Call, {
      visit: row,
      side: call.side,
      seen: call.seen,
      substitutions: [...(call.substitutions ?? [])],
      confidence: call.confidence,
      handsFelt: call.handsFelt ?? '',
      by: coach,
      at: hourOf(visit.daysAgo, 9),
      beforeFigures: true,
    });
  }
};

/** An athlete of the demo with consent, visits and calls by eye. */
export const seedAthlete = (
  em: EntityManager,
  practiceId: string,
  coach: User,
  story: AthleteStory,
): void => {
  const athlete = em.create(Athlete, {
    coach,
    givenName: story.givenName,
    familyName: story.familyName,
    // a third of a year past the last birthday
    birthDate: daysLater(today(), -Math.round((story.age + 1 / 3) * 365.25)),
    heightMm: story.heightMm,
    sport: story.sport,
    cautions: story.cautions ?? '',
  });
  const { consent } = story;
  if (consent) {
    em.create(Consent, {
      athlete,
      givenBy: consent.guardian ? 'guardian' : 'athlete',
      guardianName: consent.guardian?.name ?? null,
      guardianRelation: consent.guardian?.relation ?? null,
      assent: consent.guardian !== undefined,
      purposes: [...consent.purposes],
      held: [...consent.purposes],
      validFrom: daysLater(today(), -60),
      validUntil: daysLater(today(), consent.daysLeft),
      how: 'On paper, kept at reception.',
      recordedBy: coach,
      recordedAt: hourOf(60, 8),
    });
  }
  for (const visit of story.visits) seedVisit(em, practiceId, coach, [athlete, story], visit);
};

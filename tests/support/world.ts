import type { EntityManager } from '@mikro-orm/postgresql';
import { type InPractice, product } from '#server/db/in-practice.ts';
import type { User } from '#server/features/accounts/user.entity.ts';
import { assignCoach, makeUser } from '#server/features/accounts/user.factory.ts';
import type { Athlete } from '#server/features/athletes/athlete.entity.ts';
import { makeAthlete, makeConsent } from '#server/features/athletes/athlete.factory.ts';
import { makePractice } from '#server/features/practice/practice.factory.ts';
import type { Visit } from '#server/features/visits/visit.entity.ts';
import { makeVisit } from '#server/features/visits/visit.factory.ts';

/** Who is who: `coach` has one athlete with consent and a visit; `supervisor` is assigned to `coach` alone. */
export interface World {
  readonly practiceId: string;
  readonly owner: User;
  readonly supervisor: User;
  readonly coach: User;
  /** Another coach of the same practice: must see nothing of `athlete`. */
  readonly otherCoach: User;
  readonly athlete: Athlete;
  readonly visit: Visit;
  readonly foreignPracticeId: string;
  /** A coach of another practice: must see nothing at all. */
  readonly foreignCoach: User;
  readonly foreignOwner: User;
  readonly foreignAthlete: Athlete;
}

const athleteOf = (em: EntityManager, coach: User, givenName: string): [Athlete, Visit] => {
  const athlete = makeAthlete(em, { coach, givenName });
  makeConsent(em, { athlete, recordedBy: coach });
  return [athlete, makeVisit(em, { athlete, coach })];
};

export const makeWorld = async (inPractice: InPractice): Promise<World> => {
  const practiceId = await makePractice(inPractice, { name: 'Test Practice' });
  const foreignPracticeId = await makePractice(inPractice, { name: 'Foreign Practice' });
  const here = await inPractice(product(practiceId), ({ em }) => {
    const owner = makeUser(em, { role: 'owner' });
    const supervisor = makeUser(em, { role: 'supervisor' });
    const coach = makeUser(em, { role: 'coach' });
    const otherCoach = makeUser(em, { role: 'coach' });
    assignCoach(em, supervisor, coach);
    const [athlete, visit] = athleteOf(em, coach, 'Robin');
    return Promise.resolve({ owner, supervisor, coach, otherCoach, athlete, visit });
  });
  const there = await inPractice(product(foreignPracticeId), ({ em }) => {
    const foreignOwner = makeUser(em, { role: 'owner' });
    const foreignCoach = makeUser(em, { role: 'coach' });
    const [foreignAthlete] = athleteOf(em, foreignCoach, 'Jay');
    return Promise.resolve({ foreignOwner, foreignCoach, foreignAthlete });
  });
  return { practiceId, foreignPracticeId, ...here, ...there };
};

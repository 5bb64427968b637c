import type { EntityManager } from '@mikro-orm/postgresql';
import { hashPassword } from '../../features/accounts/password.ts';
import { Supervision } from '../../features/accounts/supervision.entity.ts';
import { User } from '../../features/accounts/user.entity.ts';
import { daysLater, today } from '../../features/athletes/days.ts';
import { Practice } from '../../features/practice/practice.entity.ts';
import { SetUp } from '../../features/visits/set-up.entity.ts';
import { enqueue } from '../../jobs/job.ts';
import type { Ground } from '../../main/ground.ts';
import { product } from '../in-practice.ts';
import type { DemoAccount } from './accounts.ts';
import { FILL_DEMO } from './fill-demo-type.ts';
import { seedAthlete } from './seed-athlete.ts';
import type { PracticeStory } from './story.ts';

const SET_UPS = [
  {
    name: 'Hall, blue line',
    distanceMm: 3000,
    lensHeightMm: 950,
    rodMm: 1000,
    beltPointerMm: 140,
    thighPointerMm: 125,
  },
  {
    name: 'Small room, no pointers',
    distanceMm: 2600,
    lensHeightMm: 900,
    rodMm: 1000,
    beltPointerMm: null,
    thighPointerMm: null,
  },
] as const;

const makePeople = (em: EntityManager, story: PracticeStory, passwordHash: string): User => {
  const make = ({ role, name, email }: DemoAccount): User =>
    em.create(User, { role, name, email, passwordHash });
  const coach = make(story.coach);
  if (story.owner) make(story.owner);
  if (story.supervisor) em.create(Supervision, { supervisor: make(story.supervisor), coach });
  return coach;
};

/**
 * A practice with its people, athletes and visits, in one transaction with the job that fills in the clips: cut
 * short at any moment, the demo is not there at all or becomes whole by itself.
 */
export const seedPractice = async (
  { inPractice }: Pick<Ground, 'inPractice'>,
  story: PracticeStory,
  password: string,
): Promise<void> => {
  const passwordHash = await hashPassword(password);
  await inPractice(product(story.id), async (unit) => {
    const { em } = unit;
    em.create(Practice, { id: story.id, name: story.name, contact: story.contact });
    await em.flush();
    const coach = makePeople(em, story, passwordHash);
    for (const setUp of SET_UPS) {
      em.create(SetUp, { ...setUp, savedBy: coach, lastUsed: daysLater(today(), -1) });
    }
    for (const athlete of story.athletes) seedAthlete(em, story.id, coach, athlete);
    await enqueue(unit, FILL_DEMO, {});
    await em.flush();
  });
};

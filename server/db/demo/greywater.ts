import { hashPassword } from '../../features/accounts/password.ts';
import { Supervision } from '../../features/accounts/supervision.entity.ts';
import { Practice } from '../../features/practice/practice.entity.ts';
import type { Ground } from '../../main/ground.ts';
import { product } from '../in-practice.ts';
import { DEMO_ACCOUNTS, GREYWATER } from './accounts.ts';
import { makePerson } from './make-people.ts';

/** The practice Greywater Row with all that hangs on it, in one transaction. */
export const seedGreywater = async ({ inPractice }: Ground, password: string): Promise<void> => {
  const hash = await hashPassword(password);
  await inPractice(product(GREYWATER), async ({ em }) => {
    em.create(Practice, {
      id: GREYWATER,
      name: 'Greywater Row',
      contact: 'Greywater Row, reception: 0555 0142',
    });
    await em.flush();
    makePerson(em, DEMO_ACCOUNTS.owner, hash);
    const supervisor = makePerson(em, DEMO_ACCOUNTS.supervisor, hash);
    const coach = makePerson(em, DEMO_ACCOUNTS.coach, hash);
    em.create(Supervision, { supervisor, coach });
  });
};

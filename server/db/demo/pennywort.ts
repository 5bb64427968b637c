import { hashPassword } from '../../features/accounts/password.ts';
import { Practice } from '../../features/practice/practice.entity.ts';
import type { Ground } from '../../main/ground.ts';
import { product } from '../in-practice.ts';
import { DEMO_ACCOUNTS, PENNYWORT } from './accounts.ts';
import { makePerson } from './make-people.ts';

/** The second practice, so that separation can be seen. */
export const seedPennywort = async ({ inPractice }: Ground, password: string): Promise<void> => {
  const hash = await hashPassword(password);
  await inPractice(product(PENNYWORT), async ({ em }) => {
    em.create(Practice, {
      id: PENNYWORT,
      name: 'Pennywort Mill',
      contact: 'Pennywort Mill, office: 0555 0187',
    });
    await em.flush();
    makePerson(em, DEMO_ACCOUNTS.foreignCoach, hash);
  });
};

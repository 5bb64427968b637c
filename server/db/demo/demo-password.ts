import type { Ground } from '../../main/ground.ts';
import { SecretFile } from '../../main/secrets.ts';
import { hashPassword, passwordFits } from '../../features/accounts/password.ts';
import { User } from '../../features/accounts/user.entity.ts';
import { product } from '../in-practice.ts';
import { DEMO_ACCOUNTS } from './accounts.ts';

const file = ({ config }: Pick<Ground, 'config'>): SecretFile =>
  new SecretFile(config.secrets, 'demo-password');

/** The set one, else the one of earlier starts, else a new random one; kept for the next start. */
export const demoPassword = async (ground: Pick<Ground, 'config'>): Promise<string> => {
  const given = ground.config.demoPassword;
  if (given === undefined) return file(ground).readOrMake(9);
  await file(ground).write(given);
  return given;
};

/** What is printed must be true: where another password was set meanwhile, the accounts get it. */
export const keepDemoPassword = async (ground: Ground, password: string): Promise<void> => {
  const { email } = DEMO_ACCOUNTS.owner;
  const [row] = await ground.orm.em
    .fork()
    .execute<{ password_hash: string }[]>('select * from find_sign_in(?)', [email]);
  if (row && (await passwordFits(password, row.password_hash))) return;
  const passwordHash = await hashPassword(password);
  for (const { practiceId, email: theirs } of Object.values(DEMO_ACCOUNTS)) {
    await ground.inPractice(product(practiceId), ({ em }) =>
      em.nativeUpdate(User, { email: theirs }, { passwordHash }),
    );
  }
};

import { product } from '../../../db/in-practice.ts';
import { handles } from '../../../jobs/job.ts';
import { User } from '../../accounts/user.entity.ts';
import { Practice } from '../../practice/practice.entity.ts';
import { choicesOf } from '../mail-choices.ts';
import { waitingLetter } from '../waiting-letters.ts';
import { SEND_WAITING_MAIL } from './send-waiting-mail-type.ts';

/** Killed after the letter was sent, it sends it again: better told twice than never. */
export const sendWaitingMailJob = handles({
  type: SEND_WAITING_MAIL,
  lockKey: ({ userId, kind }) => `${userId} ${kind}`,
  run: async ({ ground, practiceId, payload: { userId, kind, path } }) => {
    const found = await ground.inPractice(product(practiceId), async ({ em }) => ({
      user: await em.findOne(User, { id: userId, disabledAt: null }),
      practice: await em.findOneOrFail(Practice, { id: practiceId }),
      on: (await choicesOf(em, userId)).find((each) => each.kind === kind)?.on ?? true,
    }));
    if (!found.user || !found.on) return;
    const letter = waitingLetter(kind, {
      practice: found.practice.name,
      home: ground.config.publicUrl,
      path,
    });
    await ground.mail.send({ to: found.user.email, ...letter });
  },
  expireInMinutes: 5,
  retryLimit: 12,
  retryDelaySeconds: 20,
});

import { product } from '../../../db/in-practice.ts';
import { handles } from '../../../jobs/job.ts';
import { noticeLetter } from '../notices.ts';
import { User } from '../user.entity.ts';
import { SEND_NOTICE } from './send-notice-type.ts';

/** Killed after the letter was sent, it sends it again: better told twice than never. */
export const sendNoticeJob = handles({
  type: SEND_NOTICE,
  lockKey: ({ userId, notice }) => `${userId} ${notice}`,
  run: async ({ ground, practiceId, payload: { userId, notice, at } }) => {
    const user = await ground.inPractice(product(practiceId), ({ em }) =>
      em.findOne(User, { id: userId }),
    );
    if (!user) return;
    const letter = noticeLetter(notice, { at, home: ground.config.publicUrl });
    await ground.mail.send({ to: user.email, ...letter });
  },
  expireInMinutes: 5,
  retryLimit: 12,
  retryDelaySeconds: 20,
});

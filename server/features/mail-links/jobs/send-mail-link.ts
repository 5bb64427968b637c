import { handles, type JobContext } from '../../../jobs/job.ts';
import { newToken, tokenHash } from '../../../http/token-hash.ts';
import { type ArmedLink, letterOf } from '../letters.ts';
import { SEND_MAIL_LINK } from './send-mail-link-type.ts';

/**
 * Makes the token, keeps its hash, sends the letter. Run again after it was killed in between, it sends a second
 * letter, whose link works in place of the first.
 */
const run = async ({
  ground,
  payload: { linkId },
}: JobContext<{ linkId: string }>): Promise<void> => {
  const em = ground.orm.em.fork();
  const token = newToken();
  const [link] = await em.execute<ArmedLink[]>('select * from arm_mail_link(?, ?)', [
    linkId,
    tokenHash(token),
  ]);
  if (!link) return;
  const letter = letterOf(link, ground.config.publicUrl, token);
  if (letter) await ground.mail.send({ to: link.email, ...letter });
  await em.execute('select mail_link_was_sent(?)', [linkId]);
};

/** A mail server that is away is tried for about a day; what is still unsent is taken up by the next start. */
export const sendMailLinkJob = handles({
  type: SEND_MAIL_LINK,
  lockKey: ({ linkId }) => linkId,
  run,
  expireInMinutes: 5,
  retryLimit: 12,
  retryDelaySeconds: 20,
  unfinished: {
    sql: 'select link_id, practice_id from mail_links_to_send()',
    read: (row) => ({
      practiceId: String(row.practice_id),
      payload: { linkId: String(row.link_id) },
    }),
  },
});

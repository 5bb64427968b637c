import { Client } from 'pg';
import { product } from '#server/db/in-practice.ts';
import { SEND_NOTICE } from '#server/features/accounts/jobs/send-notice-type.ts';
import { sendNoticeJob } from '#server/features/accounts/jobs/send-notice.ts';
import { sendMailLinkJob } from '#server/features/mail-links/jobs/send-mail-link.ts';
import { JobOutbox } from '#server/jobs/job-outbox.entity.ts';
import type { Api } from './api.ts';

/** Writes every letter that was asked for, as the worker does. */
export const writeLetters = async ({ ground }: Api): Promise<void> => {
  const client = new Client({ connectionString: ground.config.database.jobs });
  await client.connect();
  try {
    const { rows } = await client.query<{ link_id: string; practice_id: string }>(
      'select link_id, practice_id from mail_links_to_send()',
    );
    for (const { link_id: linkId, practice_id: practiceId } of rows)
      await sendMailLinkJob.run({
        ground,
        practiceId,
        payload: { linkId },
        signal: new AbortController().signal,
      });
  } finally {
    await client.end();
  }
};

/** The token of the newest letter to an address; what is not there is a failure. */
export const tokenTo = async (api: Api, email: string): Promise<string> => {
  await writeLetters(api);
  const letter = api.mailbox.findLast(({ to }) => to === email);
  const token = /\/(?:join|reset|confirm-email)\/([\w-]+)/.exec(letter?.text ?? '')?.[1];
  if (token === undefined) throw new Error(`no link was sent to ${email}`);
  return token;
};

/** Sends the notices that were asked for since the last time, as the worker does. */
export const sendNotices = async ({ ground, world }: Api): Promise<void> => {
  const { practiceId } = world;
  const asked = await ground.inPractice(product(practiceId), async ({ em }) => {
    const rows = await em.find(JobOutbox, { queue: SEND_NOTICE.queue });
    em.remove(rows);
    return rows.map(({ payload }) => payload);
  });
  const { signal } = new AbortController();
  for (const payload of asked) await sendNoticeJob.run({ ground, practiceId, payload, signal });
};

import { Client } from 'pg';
import { sendMailLinkJob } from '#server/features/mail-links/jobs/send-mail-link.ts';
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

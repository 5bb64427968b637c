import * as z from 'zod';
import type { JobType } from '../../../jobs/job.ts';

/** Writes the letter of a link. Its queue's name stands in `ask_mail_link` too. */
export const SEND_MAIL_LINK: JobType<{ linkId: string }> = {
  queue: 'send-mail-link',
  payload: z.object({ linkId: z.uuid() }),
};

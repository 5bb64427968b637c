import * as z from 'zod';
import type { JobType } from '../../../jobs/job.ts';

/** What a person is told of their own account, wherever they are. */
export const notice = z.enum([
  'password-changed',
  'codes-on',
  'codes-off',
  'codes-reset',
  'recovery-used',
  'recovery-renewed',
]);
export type Notice = z.infer<typeof notice>;

/** Writes to the address of an account that something about its sign-in was changed. */
export const SEND_NOTICE: JobType<{ userId: string; notice: Notice; at: string }> = {
  queue: 'send-notice',
  payload: z.object({ userId: z.uuid(), notice, at: z.iso.datetime() }),
};

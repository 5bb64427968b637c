import * as z from 'zod';
import { waitingMailKind, type WaitingMailKind } from '#shared/contracts/waiting-mail.ts';
import type { JobType } from '../../../jobs/job.ts';

/** Whom it is for, and the place that opens; ids and codes only. */
export type WaitingLetter = {
  readonly userId: string;
  readonly kind: WaitingMailKind;
  /** The visit, clip, second marking or plan that it is about. */
  readonly aboutId: string;
  readonly path: string;
};

/** Writes to somebody that something waits for them. */
export const SEND_WAITING_MAIL: JobType<WaitingLetter> = {
  queue: 'send-waiting-mail',
  payload: z.object({
    userId: z.uuid(),
    kind: waitingMailKind,
    aboutId: z.uuid(),
    path: z.string().startsWith('/'),
  }),
};

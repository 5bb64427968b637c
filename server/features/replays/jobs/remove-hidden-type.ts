import * as z from 'zod';
import type { JobType } from '../../../jobs/job.ts';

/** Deletes the copies with a hidden head, and the film to keep, of a link that has ended. */
export const REMOVE_HIDDEN: JobType<{ replayId: string }> = {
  queue: 'remove-hidden',
  payload: z.object({ replayId: z.uuid() }),
};

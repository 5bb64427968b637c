import * as z from 'zod';
import type { JobType } from '../../../jobs/job.ts';

/** Makes the copy of a replay on which the head is hidden. */
export const HIDE_HEAD: JobType<{ replayId: string }> = {
  queue: 'hide-head',
  payload: z.object({ replayId: z.uuid() }),
};

import * as z from 'zod';
import type { JobType } from '../../../jobs/job.ts';

/** Makes the copy on which the head is hidden: of a link's own film, or of the earlier one beside it; the id is that of either. */
export const HIDE_HEAD: JobType<{ replayId: string }> = {
  queue: 'hide-head',
  payload: z.object({ replayId: z.uuid() }),
};

import * as z from 'zod';
import type { JobType } from '../../../jobs/job.ts';

/** Makes the copies of a clip. */
export const PREPARE_CLIP: JobType<{ clipId: string }> = {
  queue: 'prepare-clip',
  payload: z.object({ clipId: z.uuid() }),
};

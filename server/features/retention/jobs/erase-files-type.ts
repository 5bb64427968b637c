import * as z from 'zod';
import type { JobType } from '../../../jobs/job.ts';

/** Deletes the files of somebody whose rows are gone. `again`: what was written by work that was under way then. */
export const ERASE_FILES: JobType<{ erasureId: string; again?: boolean | undefined }> = {
  queue: 'erase-files',
  payload: z.object({ erasureId: z.uuid(), again: z.boolean().optional() }),
};

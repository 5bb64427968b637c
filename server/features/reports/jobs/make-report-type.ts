import * as z from 'zod';
import type { JobType } from '../../../jobs/job.ts';

/** Writes a report that was asked for. */
export const MAKE_REPORT: JobType<{ reportId: string }> = {
  queue: 'make-report',
  payload: z.object({ reportId: z.uuid() }),
};

import * as z from 'zod';
import type { JobType } from '../../jobs/job.ts';

/** Fills a demo practice with its clips and what was done to them. */
export const FILL_DEMO: JobType<Record<string, never>> = {
  queue: 'fill-demo',
  payload: z.record(z.string(), z.never()),
};

import * as z from 'zod';
import { side } from '#shared/contracts/primitives.ts';
import type { JobType } from '../../../jobs/job.ts';

const payload = z.object({ visitId: z.uuid(), side });

/** Makes the reading of a side anew, so that every list shows the marks as they stand. */
export const DERIVE_READING: JobType<z.infer<typeof payload>> = {
  queue: 'derive-reading',
  payload,
};

import * as z from 'zod';
import type { JobType } from '../../../../jobs/job.ts';

/** Makes a film to keep that was asked for. */
export const MAKE_FILM: JobType<{ filmId: string }> = {
  queue: 'make-film',
  payload: z.object({ filmId: z.uuid() }),
};

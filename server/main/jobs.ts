import type { AnyJobHandler } from '../jobs/job.ts';

/** Every kind of job that a worker does. */
export const jobs: readonly AnyJobHandler[] = [];

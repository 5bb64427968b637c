import { giveUpUploadsJob } from '../features/clips/jobs/give-up-uploads.ts';
import { prepareClipJob } from '../features/clips/jobs/prepare-clip.ts';
import { fillDemoJob } from '../db/demo/fill-demo.job.ts';
import { sendNoticeJob } from '../features/accounts/jobs/send-notice.ts';
import { sendMailLinkJob } from '../features/mail-links/jobs/send-mail-link.ts';
import { makeFilmJob } from '../features/replays/film/jobs/make-film.ts';
import { hideHeadJob } from '../features/replays/jobs/hide-head.ts';
import { removeHiddenJob } from '../features/replays/jobs/remove-hidden.ts';
import { makeReportJob } from '../features/reports/jobs/make-report.ts';
import { deriveReadingJob } from '../features/readings/jobs/derive-reading.ts';
import { eraseFilesJob } from '../features/retention/jobs/erase-files.ts';
import { tidyJob } from '../features/retention/jobs/tidy.ts';
import { sendWaitingMailJob } from '../features/waiting-mail/jobs/send-waiting-mail.ts';
import type { AnyJobHandler } from '../jobs/job.ts';

/** Every kind of job that a worker does. */
export const jobs: readonly AnyJobHandler[] = [
  prepareClipJob,
  giveUpUploadsJob,
  deriveReadingJob,
  hideHeadJob,
  makeFilmJob,
  removeHiddenJob,
  makeReportJob,
  sendMailLinkJob,
  sendWaitingMailJob,
  sendNoticeJob,
  tidyJob,
  eraseFilesJob,
  fillDemoJob,
];

import { eventsFeature } from '../events/events.routes.ts';
import { accountsFeature } from '../features/accounts/accounts.routes.ts';
import { athletesFeature } from '../features/athletes/athletes.routes.ts';
import { auditFeature } from '../features/audit/audit.routes.ts';
import { consentsFeature } from '../features/consents/consents.routes.ts';
import { benchFeature } from '../features/bench/bench.routes.ts';
import { callsFeature } from '../features/calls/calls.routes.ts';
import { clipsFeature } from '../features/clips/clips.routes.ts';
import { formUploadFeature } from '../features/clips/form-upload.ts';
import { resumableUploadFeature } from '../features/clips/resumable-upload.ts';
import { commentsFeature } from '../features/comments/comments.routes.ts';
import { exportsFeature } from '../features/exports/exports.routes.ts';
import { headsFeature } from '../features/heads/heads.routes.ts';
import { mailLinksFeature } from '../features/mail-links/mail-links.routes.ts';
import { oneTimeCodesFeature } from '../features/one-time-codes/one-time-codes.routes.ts';
import { peopleFeature } from '../features/people/people.routes.ts';
import { plansFeature } from '../features/plans/plans.routes.ts';
import { practiceFeature } from '../features/practice/practice.routes.ts';
import { protocolFeature } from '../features/protocol/protocol.routes.ts';
import { readingsFeature } from '../features/readings/readings.routes.ts';
import { replaysFeature } from '../features/replays/replays.routes.ts';
import { repsFeature } from '../features/reps/reps.routes.ts';
import { reportsFeature } from '../features/reports/reports.routes.ts';
import { retentionFeature } from '../features/retention/retention.routes.ts';
import { reviewsFeature } from '../features/reviews/reviews.routes.ts';
import { secondMarkingsFeature } from '../features/second-markings/second-markings.routes.ts';
import { systemFeature } from '../features/system/system.routes.ts';
import { todayFeature } from '../features/today/today.routes.ts';
import { visitsFeature } from '../features/visits/visits.routes.ts';
import { waitingMailFeature } from '../features/waiting-mail/waiting-mail.routes.ts';
import type { Feature } from './feature.ts';

/** Every feature that is served. */
export const features: readonly Feature[] = [
  systemFeature,
  accountsFeature,
  oneTimeCodesFeature,
  mailLinksFeature,
  waitingMailFeature,
  peopleFeature,
  todayFeature,
  athletesFeature,
  consentsFeature,
  retentionFeature,
  visitsFeature,
  clipsFeature,
  formUploadFeature,
  resumableUploadFeature,
  callsFeature,
  repsFeature,
  practiceFeature,
  protocolFeature,
  auditFeature,
  readingsFeature,
  reviewsFeature,
  secondMarkingsFeature,
  headsFeature,
  plansFeature,
  replaysFeature,
  commentsFeature,
  exportsFeature,
  reportsFeature,
  benchFeature,
  eventsFeature,
];

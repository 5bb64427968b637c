import { RecoveryCode } from '../features/accounts/recovery-code.entity.ts';
import { Session } from '../features/accounts/session.entity.ts';
import { Supervision } from '../features/accounts/supervision.entity.ts';
import { User } from '../features/accounts/user.entity.ts';
import { Athlete } from '../features/athletes/athlete.entity.ts';
import { Consent } from '../features/athletes/consent.entity.ts';
import { ConsentWording } from '../features/consents/consent-wording.entity.ts';
import { Call } from '../features/calls/call.entity.ts';
import { Clip } from '../features/clips/clip.entity.ts';
import { Upload } from '../features/clips/upload.entity.ts';
import { Comment } from '../features/comments/comment.entity.ts';
import { Head } from '../features/heads/head.entity.ts';
import { MailLink } from '../features/mail-links/mail-link.entity.ts';
import { MarkCommand } from '../features/marks/mark-command.entity.ts';
import { Mark } from '../features/marks/mark.entity.ts';
import { AuditEntry } from '../features/audit/audit-entry.entity.ts';
import { GivenPlan } from '../features/plans/given-plan.entity.ts';
import { PlanPain, PlanTick } from '../features/plans/plan-answers.entity.ts';
import { PlanItem } from '../features/plans/plan-item.entity.ts';
import { Plan } from '../features/plans/plan.entity.ts';
import { Practice } from '../features/practice/practice.entity.ts';
import { ProtocolVersion } from '../features/protocol/protocol-version.entity.ts';
import { Reading } from '../features/readings/reading.entity.ts';
import { SideSetting } from '../features/readings/side-setting.entity.ts';
import { KeptFilm } from '../features/replays/film/kept-film.entity.ts';
import { ReplayBefore } from '../features/replays/before/replay-before.entity.ts';
import { Replay } from '../features/replays/replay.entity.ts';
import { Rep } from '../features/reps/rep.entity.ts';
import { Report } from '../features/reports/report.entity.ts';
import { Erasure } from '../features/retention/erasure.entity.ts';
import { Review } from '../features/reviews/review.entity.ts';
import { SideReview } from '../features/reviews/side-review.entity.ts';
import { SecondMarkCommand } from '../features/second-markings/second-mark-command.entity.ts';
import { SecondMark } from '../features/second-markings/second-mark.entity.ts';
import { SecondMarking } from '../features/second-markings/second-marking.entity.ts';
import { SetUp } from '../features/visits/set-up.entity.ts';
import { MailChoice } from '../features/waiting-mail/mail-choice.entity.ts';
import { Visit } from '../features/visits/visit.entity.ts';
import { JobOutbox } from '../jobs/job-outbox.entity.ts';

/** Every table of the product. A new one is added here, then `npm run orm migration:create`. */
export const entities = [
  Practice,
  AuditEntry,
  User,
  Supervision,
  Session,
  RecoveryCode,
  MailLink,
  MailChoice,
  Athlete,
  ConsentWording,
  Consent,
  SetUp,
  Visit,
  Clip,
  Upload,
  Rep,
  Mark,
  MarkCommand,
  SecondMarking,
  SecondMark,
  SecondMarkCommand,
  Call,
  ProtocolVersion,
  Reading,
  SideSetting,
  Review,
  SideReview,
  Plan,
  PlanItem,
  GivenPlan,
  PlanTick,
  PlanPain,
  Comment,
  Head,
  Replay,
  ReplayBefore,
  KeptFilm,
  Report,
  Erasure,
  JobOutbox,
];

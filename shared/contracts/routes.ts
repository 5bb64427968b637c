import { accountRoutes } from './accounts.ts';
import { athleteRoutes } from './athletes.ts';
import { auditRoutes } from './audit.ts';
import { benchRoutes } from './bench.ts';
import { callRoutes } from './calls.ts';
import { clipRoutes } from './clip-routes.ts';
import { commentRoutes } from './comments.ts';
import { consentWordingRoutes } from './consents.ts';
import { eventRoutes } from './events.ts';
import { exportRoutes } from './exports.ts';
import { headRoutes } from './heads.ts';
import { keptFilmRoutes } from './kept-film.ts';
import { mailLinkRoutes } from './mail-links.ts';
import { oneTimeCodeRoutes } from './one-time-codes.ts';
import { athletePlanRoutes } from './athlete-plan.ts';
import { peopleRoutes } from './people.ts';
import { planRoutes } from './plans.ts';
import { practiceRoutes } from './practice.ts';
import { protocolRoutes } from './protocol.ts';
import { readingRoutes } from './readings.ts';
import { reliabilityRoutes } from './reliability.ts';
import { repRoutes } from './reps.ts';
import { replayRoutes } from './replays.ts';
import { reportRoutes } from './reports.ts';
import { retentionRoutes } from './retention.ts';
import { reviewRoutes } from './reviews.ts';
import { secondMarkingRoutes } from './second-markings.ts';
import { systemRoutes } from './system.ts';
import { todayRoutes } from './today.ts';
import { waitingMailRoutes } from './waiting-mail.ts';
import { visitRoutes } from './visits.ts';

/** Every route of the product by name. A route that is not here is not served. */
export const routes = {
  ...systemRoutes,
  ...accountRoutes,
  ...oneTimeCodeRoutes,
  ...mailLinkRoutes,
  ...waitingMailRoutes,
  ...peopleRoutes,
  ...todayRoutes,
  ...athleteRoutes,
  ...consentWordingRoutes,
  ...retentionRoutes,
  ...visitRoutes,
  ...clipRoutes,
  ...repRoutes,
  ...secondMarkingRoutes,
  ...reliabilityRoutes,
  ...benchRoutes,
  ...callRoutes,
  ...practiceRoutes,
  ...protocolRoutes,
  ...auditRoutes,
  ...readingRoutes,
  ...reviewRoutes,
  ...commentRoutes,
  ...exportRoutes,
  ...reportRoutes,
  ...headRoutes,
  ...keptFilmRoutes,
  ...planRoutes,
  ...replayRoutes,
  ...athletePlanRoutes,
  ...eventRoutes,
};
export type RouteName = keyof typeof routes;

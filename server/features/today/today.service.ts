import type { UserActor } from '#shared/access/actors.ts';
import type { Today } from '#shared/contracts/today.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { need } from '../../http/need.ts';
import { inSightSql } from '../athletes/caseload.ts';
import { daysLater, today } from '../athletes/days.ts';
import { clipTasks } from './clip-tasks.ts';
import { consentTasks, deletionTasks, linkTasks, retestTasks } from './lapse-tasks.ts';
import { painTasks } from './pain-tasks.ts';
import { callTasks, repTasks } from './marking-tasks.ts';
import { commentTasks, readingTasks, sentBackTasks, toReviewTasks } from './review-tasks.ts';
import { firstSteps } from './first-steps.ts';
import { heldClipTasks } from './held-clips.ts';
import type { WaitingItem } from './scope.ts';
import { secondMarkingTasks } from './second-marking-tasks.ts';

/** Pain comes first. Somebody who waits comes before something that waits, and what ends by itself comes last. */
const KINDS: readonly ((unit: Unit<UserActor>) => Promise<WaitingItem[]>)[] = [
  painTasks,
  toReviewTasks,
  sentBackTasks,
  commentTasks,
  readingTasks,
  secondMarkingTasks,
  callTasks,
  repTasks,
  clipTasks,
  heldClipTasks,
  retestTasks,
  deletionTasks,
  consentTasks,
  linkTasks,
];

/** Weeks begin on Monday (ISO 8601). */
export const mondayOf = (day: string): string => {
  const weekday = new Date(`${day}T00:00:00Z`).getUTCDay();
  return daysLater(day, -((weekday + 6) % 7));
};

/** What waits for this person, most pressing first. */
export const readToday = async (unit: Unit<UserActor>): Promise<Today> => {
  const { em, actor } = unit;
  need(actor, 'practice.read', { kind: 'practice', practiceId: actor.practiceId });
  const items: WaitingItem[] = [];
  for (const kind of KINDS) items.push(...(await kind(unit)));
  const inSight = inSightSql(actor, 'a.coach_id');
  const monday = mondayOf(today());
  const [counts] = await em.execute<{ athletes: number; visits: number }[]>(
    `select count(distinct a.id)::int as athletes, count(v.id)::int as visits
     from athlete a left join visit v on v.athlete_id = a.id and v.day between ?::date and ?::date
     where ${inSight.sql}`,
    [monday, daysLater(monday, 6), ...inSight.params],
  );
  return {
    items,
    athletes: counts?.athletes ?? 0,
    visitsThisWeek: counts?.visits ?? 0,
    steps: await firstSteps(unit),
  };
};

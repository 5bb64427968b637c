import type { Action } from '#shared/access/actions.ts';
import type { UserActor } from '#shared/access/actors.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { Problem } from '../../http/problem.ts';
import type { Athlete } from './athlete.entity.ts';
import { coachesInSight } from './caseload.ts';
import { counting, hasConsent } from './consent-check.ts';
import { today } from './days.ts';

/** What takes something away stays possible. */
const TAKES_AWAY: ReadonlySet<Action> = new Set<Action>(['clip.delete', 'comment.delete']);

/**
 * Whether what was filmed of this athlete may be opened for the purpose that this person has: their supervisor's is
 * supervision, everybody else's assessment. Asked after `need`, of those who may know that the athlete exists.
 * A consent that lapsed without being withdrawn closes nothing that is there.
 * @throws Problem 'consent-withdrawn' or 'supervision-not-agreed'
 */
export const needOpen = async (
  { em, actor }: Unit<UserActor>,
  athlete: Pick<Athlete, 'id' | 'coach' | 'deletionDue'>,
  action: Action,
): Promise<void> => {
  if (TAKES_AWAY.has(action)) return;
  if (athlete.deletionDue)
    throw new Problem(
      'consent-withdrawn',
      `The consent to filming was withdrawn. What was filmed is closed and is deleted on ${athlete.deletionDue}, unless a new consent is recorded.`,
    );
  const assigned = actor.role === 'supervisor' && athlete.coach.id !== actor.id;
  if (assigned && !(await hasConsent(em, athlete.id, 'supervision')))
    throw new Problem('supervision-not-agreed');
};

/** The same as a condition on an athlete `a`, together with who may see them: for lists of what was filmed. */
export const openInSightSql = (
  actor: UserActor,
): { readonly sql: string; readonly params: readonly string[] } => {
  const coaches = coachesInSight(actor);
  if (coaches === null) return { sql: 'a.deletion_due is null', params: [] };
  const { sql, params } = counting(today());
  return {
    sql: `a.deletion_due is null and a.coach_id = any (?::uuid[]) and (a.coach_id = ? or exists (
      select from consent x where x.athlete_id = a.id and ${sql} and 'supervision' = any (x.held)))`,
    params: [`{${coaches.join(',')}}`, actor.id, ...params],
  };
};

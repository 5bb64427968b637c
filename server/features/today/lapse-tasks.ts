import type { UserActor } from '#shared/access/actors.ts';
import type { Side } from '#shared/contracts/primitives.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { daysLater, today } from '../athletes/days.ts';
import {
  answeredFor,
  AT_MOST,
  ATHLETE,
  type Named,
  ownOpenAthletes,
  type WaitingItem,
  whoAndWhen,
} from './scope.ts';

/** Long enough before to ask at the next visit. */
const CONSENT_DAYS = 14;
const LINK_DAYS = 3;
/** Long enough before to ask the athlete in. */
const RETEST_DAYS = 7;

type ConsentRow = Named & { until: string };
type LinkRow = Named & {
  visit_id: string;
  side: Side;
  replay_id: string;
  expires_at: Date | string;
};

type RetestRow = Named & { plan_id: string; side: Side; due: string };

type DeletionRow = Named & { due: string };

/** Athletes who go on a day that is named, because their consent to filming was withdrawn; soonest first. */
export const deletionTasks = async ({ em, actor }: Unit<UserActor>): Promise<WaitingItem[]> => {
  const scope = answeredFor(actor);
  const rows = await em.execute<DeletionRow[]>(
    `select ${ATHLETE}, coalesce(max(x.withdrawn_at), now()) as at, a.deletion_due::text as due
     from athlete a left join consent x on x.athlete_id = a.id
     where ${scope.sql} and a.deletion_due is not null
     group by a.id order by a.deletion_due, a.id limit ${AT_MOST}`,
    [...scope.params],
  );
  return rows.map((row) => ({ kind: 'deletion-due', due: row.due, ...whoAndWhen(row) }));
};

/** Athletes whose last valid consent to filming ends soon. */
export const consentTasks = async ({ em, actor }: Unit<UserActor>): Promise<WaitingItem[]> => {
  const scope = answeredFor(actor);
  const rows = await em.execute<ConsentRow[]>(
    `select ${ATHLETE}, max(x.recorded_at) as at, max(x.valid_until)::text as until
     from consent x join athlete a on a.id = x.athlete_id
     where ${scope.sql} and x.withdrawn_at is null and 'assessment' = any (x.held)
       and x.valid_from <= ?::date
     group by a.id having max(x.valid_until) between ?::date and ?::date
     order by until, a.id limit ${AT_MOST}`,
    [...scope.params, today(), today(), daysLater(today(), CONSENT_DAYS)],
  );
  return rows.map((row) => ({ kind: 'consent-lapses', until: row.until, ...whoAndWhen(row) }));
};

/** Retests that are due, as long as the athlete has not been filmed since; soonest first. */
export const retestTasks = async ({ em, actor }: Unit<UserActor>): Promise<WaitingItem[]> => {
  const own = ownOpenAthletes(actor);
  const rows = await em.execute<RetestRow[]>(
    `select ${ATHLETE}, p.made_at as at, p.id as plan_id, p.side, p.retest_on::text as due
     from plan p join visit v on v.id = p.visit_id join athlete a on a.id = v.athlete_id
     where ${own.sql} and p.retest_on <= ?::date
       and not exists (select from visit w where w.athlete_id = a.id and w.day > v.day)
     order by p.retest_on, p.id limit ${AT_MOST}`,
    [...own.params, daysLater(today(), RETEST_DAYS)],
  );
  return rows.map((row) => ({
    kind: 'retest-due',
    planId: row.plan_id,
    side: row.side,
    due: row.due,
    ...whoAndWhen(row),
  }));
};

/** Replay links that end soon. */
export const linkTasks = async ({ em, actor }: Unit<UserActor>): Promise<WaitingItem[]> => {
  const scope = answeredFor(actor);
  const rows = await em.execute<LinkRow[]>(
    `select ${ATHLETE}, p.at, p.visit_id, p.side, p.id as replay_id, p.expires_at
     from replay p join visit v on v.id = p.visit_id join athlete a on a.id = v.athlete_id
     where ${scope.sql} and p.revoked_at is null
       and p.expires_at between now() and now() + interval '${LINK_DAYS} days'
     order by p.expires_at limit ${AT_MOST}`,
    [...scope.params],
  );
  return rows.map((row) => ({
    kind: 'link-lapses',
    visitId: row.visit_id,
    side: row.side,
    replayId: row.replay_id,
    expiresAt: new Date(row.expires_at).toISOString(),
    ...whoAndWhen(row),
  }));
};

import type { UserActor } from '#shared/access/actors.ts';
import type { Side } from '#shared/contracts/primitives.ts';
import { readingLabel, type ReadingCode } from '#shared/contracts/readings.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { openInSightSql } from '../athletes/consent-gate.ts';
import { reviewQueue } from '../reviews/review-queue.ts';
import {
  AT_MOST,
  ATHLETE,
  type Named,
  ownOpenAthletes,
  type WaitingItem,
  whoAndWhen,
} from './scope.ts';

/** Older readings are history, not work. */
const READING_DAYS = 14;

type ReadingRow = Named & {
  visit_id: string;
  side: Side;
  code: ReadingCode;
  before60: boolean;
  gate_from: number;
  signed_off: boolean;
};
type SentBackRow = Named & {
  visit_id: string;
  side: Side;
  reason: string;
  by_id: string;
  by_name: string;
};
type CommentRow = Named & {
  clip_id: string;
  comment_id: string;
  frame: number;
  body: string;
  by_id: string;
  by_name: string;
};

/**
 * Recent readings of one's own athletes that wait for the next hand: until they are handed in, and once signed off
 * until a plan is made from them or a replay shows them to the athlete. A side without a call by eye shows no reading.
 */
export const readingTasks = async ({ em, actor }: Unit<UserActor>): Promise<WaitingItem[]> => {
  const own = ownOpenAthletes(actor);
  const rows = await em.execute<ReadingRow[]>(
    `select ${ATHLETE}, r.at, r.visit_id, r.side, r.code, r.before60, r.gate_from,
       coalesce(w.step = 'signed-off' and w.reading_id = r.id, false) as signed_off
     from side_setting s
     join reading r on r.id = s.reading_id
     join visit v on v.id = s.visit_id
     join athlete a on a.id = v.athlete_id
     left join side_review h on h.visit_id = s.visit_id and h.side = s.side
     left join review w on w.id = h.last_id
     where ${own.sql} and r.at > now() - interval '${READING_DAYS} days'
       and exists (select from call where call.visit_id = s.visit_id and call.side = s.side)
       and not exists (select from replay p where p.visit_id = s.visit_id and p.side = s.side)
       and not exists (select from plan q where q.visit_id = s.visit_id and q.side = s.side)
       and w.step is distinct from 'handed-in' and w.step is distinct from 'sent-back'
     order by r.at limit ${AT_MOST}`,
    [...own.params],
  );
  return rows.map((row) => ({
    kind: 'reading-ready',
    visitId: row.visit_id,
    side: row.side,
    label: readingLabel(row.code, row.before60, row.gate_from),
    signedOff: row.signed_off,
    ...whoAndWhen(row),
  }));
};

/** Sides that wait for this person's word, longest waiting first. */
export const toReviewTasks = async (unit: Unit<UserActor>): Promise<WaitingItem[]> =>
  (await reviewQueue(unit)).items.map((item) => ({ kind: 'to-review', ...item }));

/** Sides of one's own athletes that came back with a reason, until they are handed in again. */
export const sentBackTasks = async ({ em, actor }: Unit<UserActor>): Promise<WaitingItem[]> => {
  const own = ownOpenAthletes(actor);
  const rows = await em.execute<SentBackRow[]>(
    `select ${ATHLETE}, w.at, h.visit_id, h.side, w.reason, u.id as by_id, u.name as by_name
     from side_review h
     join review w on w.id = h.last_id
     join visit v on v.id = h.visit_id
     join athlete a on a.id = v.athlete_id
     join account u on u.id = w.by_id
     where ${own.sql} and w.step = 'sent-back'
     order by w.at limit ${AT_MOST}`,
    [...own.params],
  );
  return rows.map((row) => ({
    kind: 'sent-back',
    visitId: row.visit_id,
    side: row.side,
    reason: row.reason,
    by: { id: row.by_id, name: row.by_name },
    ...whoAndWhen(row),
  }));
};

/** Open threads whose last word is somebody else's: on one's own athletes, or begun or joined by oneself. */
export const commentTasks = async ({ em, actor }: Unit<UserActor>): Promise<WaitingItem[]> => {
  const inSight = openInSightSql(actor);
  const rows = await em.execute<CommentRow[]>(
    `select ${ATHLETE}, last.at, m.clip_id, m.id as comment_id, m.from_frame as frame, last.body, u.id as by_id,
       u.name as by_name
     from comment m
     join clip c on c.id = m.clip_id
     join visit v on v.id = c.visit_id
     join athlete a on a.id = v.athlete_id
     join lateral (
       select w.by_id, w.body, w.at from comment w where w.id = m.id or w.answer_to = m.id
       order by w.at desc, w.id limit 1
     ) last on true
     join account u on u.id = last.by_id
     where m.answer_to is null and m.resolved_at is null and ${inSight.sql} and last.by_id <> ?
       and (a.coach_id = ? or exists (
         select from comment w where (w.id = m.id or w.answer_to = m.id) and w.by_id = ?
       ))
     order by last.at limit ${AT_MOST}`,
    [...inSight.params, actor.id, actor.id, actor.id],
  );
  return rows.map((row) => ({
    kind: 'comment-open',
    clipId: row.clip_id,
    commentId: row.comment_id,
    frame: row.frame,
    body: row.body,
    by: { id: row.by_id, name: row.by_name },
    ...whoAndWhen(row),
  }));
};

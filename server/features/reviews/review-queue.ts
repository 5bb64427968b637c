import type { UserActor } from '#shared/access/actors.ts';
import type { Seen } from '#shared/contracts/calls.ts';
import type { Side } from '#shared/contracts/primitives.ts';
import { readingLabel, type ReadingCode } from '#shared/contracts/readings.ts';
import type { ReviewItem } from '#shared/contracts/reviews.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { need } from '../../http/need.ts';
import { openInSightSql } from '../athletes/consent-gate.ts';
import { plusMinus } from '../readings/plus-minus.ts';
import { CLIPS_OF_SIDE } from './open-threads.ts';

/** A list that nobody reads to its end. */
const AT_MOST = 100;

type Row = {
  visit_id: string;
  side: Side;
  day: string;
  athlete_id: string;
  athlete_name: string;
  coach_id: string;
  coach_name: string;
  at: Date | string;
  by_reading: boolean;
  code: ReadingCode | null;
  before60: boolean | null;
  gate_from: number | null;
  change: number | null;
  u: number | null;
  seen: Seen | null;
  again: boolean;
  open_comments: number;
  clip_id: string | null;
  comment_id: string | null;
  frame: number | null;
  mine: boolean | null;
};

const FROM = `from side_review s
  join visit v on v.id = s.visit_id
  join athlete a on a.id = v.athlete_id`;
const WAITS = `s.waits_since is not null and a.coach_id <> ?`;

/**
 * Sides that were handed in, longest waiting first, of athletes who are not this person's own. What is shown is the
 * reading as it stands, and the moment that opens is the first comment that nobody has resolved.
 */
const queueSql = (inSight: string) => `
  with waiting as (
    select s.visit_id, s.side, s.waits_since, s.sent_back, s.last_id, v.day, a.id as athlete_id,
      a.given_name || ' ' || a.family_name as athlete_name, a.coach_id
    ${FROM} where ${WAITS} and ${inSight}
    order by s.waits_since, s.id limit ${AT_MOST}
  )
  select s.visit_id, s.side, s.day::text, s.athlete_id, s.athlete_name, s.coach_id, u.name as coach_name,
    s.waits_since as at, w.reading_id is not null as by_reading, r.code, r.before60, r.gate_from, r.change, r.u,
    k.seen, s.sent_back as again, coalesce(m.open, 0)::int as open_comments,
    coalesce(m.clip_id, e.clip_id, f.id) as clip_id, m.id as comment_id,
    coalesce(m.from_frame, e.start_frame, 0) as frame, m.by_id = ? as mine
  from waiting s
  join account u on u.id = s.coach_id
  join review w on w.id = s.last_id
  left join side_setting g on g.visit_id = s.visit_id and g.side = s.side
  left join reading r on r.id = g.reading_id and w.reading_id is not null
  left join lateral (
    select seen from call where call.visit_id = s.visit_id and call.side = s.side order by at desc limit 1
  ) k on true
  left join lateral (
    select m.id, m.clip_id, m.from_frame, m.by_id, count(*) over () as open
    from (${CLIPS_OF_SIDE}) c join comment m on m.clip_id = c.id
    where m.answer_to is null and m.resolved_at is null
    order by c.uploaded_at, m.from_frame, m.at limit 1
  ) m on true
  left join lateral (
    select e.clip_id, e.start_frame from (${CLIPS_OF_SIDE}) c join rep e on e.clip_id = c.id
    where e.support_side = s.side and e.excluded is null
    order by c.uploaded_at, e.start_frame limit 1
  ) e on true
  left join lateral (select c.id from (${CLIPS_OF_SIDE}) c order by c.uploaded_at limit 1) f on true
  order by s.waits_since, s.visit_id, s.side`;

const presentItem = (row: Row): ReviewItem => ({
  visitId: row.visit_id,
  side: row.side,
  day: row.day,
  athlete: { id: row.athlete_id, name: row.athlete_name },
  coach: { id: row.coach_id, name: row.coach_name },
  at: new Date(row.at).toISOString(),
  about: row.by_reading ? 'reading' : 'call',
  label:
    row.code === null
      ? null
      : readingLabel(row.code, row.before60 === true, row.gate_from ?? Number.NaN),
  change: row.change,
  plusMinus: plusMinus(row.u),
  seen: row.seen,
  again: row.again,
  openComments: row.open_comments,
  opens:
    row.clip_id === null
      ? null
      : {
          clipId: row.clip_id,
          frame: row.frame ?? 0,
          commentId: row.comment_id,
          mine: row.mine === true,
        },
});

/** What waits for this person's word, longest waiting first, and how much that is in all. */
export const reviewQueue = async ({
  em,
  actor,
}: Unit<UserActor>): Promise<{ items: ReviewItem[]; total: number }> => {
  need(actor, 'practice.read', { kind: 'practice', practiceId: actor.practiceId });
  const inSight = openInSightSql(actor);
  const rows = await em.execute<Row[]>(queueSql(inSight.sql), [
    actor.id,
    ...inSight.params,
    actor.id,
  ]);
  const items = rows.map(presentItem);
  if (items.length < AT_MOST) return { items, total: items.length };
  const [all] = await em.execute<{ total: number }[]>(
    `select count(*)::int as total ${FROM} where ${WAITS} and ${inSight.sql}`,
    [actor.id, ...inSight.params],
  );
  return { items, total: all?.total ?? items.length };
};

import type { UserActor } from '#shared/access/actors.ts';
import type { Side } from '#shared/contracts/primitives.ts';
import type { Seen } from '#shared/contracts/calls.ts';
import type { ReadingCode } from '#shared/contracts/readings.ts';
import type { ReviewStep } from '#shared/contracts/reviews.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { athleteInSight } from '../athletes/athlete-in-sight.ts';

/** One side of one visit: the first call by eye and, once there is one, the reading of the marks as they stand. */
export type HistorySide = { side: Side; call: Seen | null; review: HistoryReview | null } & (
  Measured | { [K in keyof Measured]: null }
);

/** The latest step of its review, and what stands there now. */
type HistoryReview = {
  step: ReviewStep['step'];
  reading: string | null;
  call: string | null;
  readingNow: string | null;
  callNow: string;
};

type Measured = {
  code: ReadingCode;
  before60: boolean;
  gateFrom: number;
  gateTo: number;
  change: number | null;
  u: number | null;
  provisional: boolean;
};

export type HistoryRow = {
  id: string;
  day: string;
  coach_id: string;
  coach_name: string;
  clip_count: number;
  sides: HistorySide[];
};

/** Figures stay hidden where no call by eye was recorded: the join to the reading goes through the call. */
const HISTORY = `
  select v.id, v.day::text, v.coach_id, coach.name as coach_name,
    (select count(*)::int from clip where clip.visit_id = v.id) as clip_count,
    coalesce((
      select json_agg(json_build_object(
        'side', c.side, 'call', c.seen, 'code', r.code, 'before60', r.before60,
        'gateFrom', r.gate_from, 'gateTo', r.gate_to, 'change', r.change, 'u', r.u, 'provisional', r.provisional,
        'review', case when w.id is not null then json_build_object(
          'step', w.step, 'reading', w.reading_id, 'call', w.call_id, 'readingNow', s.reading_id, 'callNow', c.latest
        ) end
      ) order by c.side)
      from (
        select distinct on (side) side, seen,
          last_value(id) over (partition by side order by at, id rows between unbounded preceding and unbounded following) as latest
        from call where call.visit_id = v.id order by side, at, id
      ) c
      left join side_setting s on s.visit_id = v.id and s.side = c.side
      left join reading r on r.id = s.reading_id
      left join side_review h on h.visit_id = v.id and h.side = c.side
      left join review w on w.id = h.last_id
    ), '[]') as sides
  from visit v
  join account coach on coach.id = v.coach_id
  where v.athlete_id = ?
  order by v.day desc, v.created_at desc`;

/** An athlete's visits, newest first. */
export const listVisits = async (
  unit: Unit<UserActor>,
  athleteId: string,
): Promise<HistoryRow[]> => {
  await athleteInSight(unit, athleteId, 'athlete.read');
  return unit.em.execute<HistoryRow[]>(HISTORY, [athleteId]);
};

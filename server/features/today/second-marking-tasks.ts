import type { UserActor } from '#shared/access/actors.ts';
import type { Side } from '#shared/contracts/primitives.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { openInSightSql } from '../athletes/consent-gate.ts';
import { AT_MOST, ATHLETE, type Named, type WaitingItem, whoAndWhen } from './scope.ts';

type SecondRow = Named & {
  second_marking_id: string;
  number: number;
  side: Side;
  frames: number;
  by_id: string;
  by_name: string;
};

/** Second markings that this person was asked for and has not finished, longest waiting first; nothing of any mark. */
export const secondMarkingTasks = async ({
  em,
  actor,
}: Unit<UserActor>): Promise<WaitingItem[]> => {
  const inSight = openInSightSql(actor);
  const rows = await em.execute<SecondRow[]>(
    `select ${ATHLETE}, s.asked_at as at, s.id as second_marking_id, r.number, r.support_side as side,
       jsonb_array_length(s.frames) as frames, u.id as by_id, u.name as by_name
     from second_marking s
     join (
       select id, clip_id, support_side,
         row_number() over (partition by clip_id order by start_frame, created_at, id)::int as number
       from rep
     ) r on r.id = s.rep_id
     join clip c on c.id = r.clip_id
     join visit v on v.id = c.visit_id
     join athlete a on a.id = v.athlete_id
     join account u on u.id = s.asked_by_id
     where s.marker_id = ? and s.finished_at is null and ${inSight.sql}
     order by s.asked_at, s.id limit ${AT_MOST}`,
    [actor.id, ...inSight.params],
  );
  return rows.map((row) => ({
    kind: 'second-marking-asked',
    secondMarkingId: row.second_marking_id,
    repNumber: row.number,
    side: row.side,
    frames: row.frames,
    askedBy: { id: row.by_id, name: row.by_name },
    mine: row.by_id === actor.id,
    ...whoAndWhen(row),
  }));
};

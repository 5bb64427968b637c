import type { UserActor } from '#shared/access/actors.ts';
import type { Side } from '#shared/contracts/primitives.ts';
import type { Unit } from '#server/db/in-practice.ts';
import {
  AT_MOST,
  ATHLETE,
  type Named,
  ownOpenAthletes,
  type WaitingItem,
  whoAndWhen,
} from './scope.ts';

type CallRow = Named & { visit_id: string; side: Side };
type RepRow = Named & { clip_id: string; number: number | null; side: Side | null };

/** Sides that were filmed and that nobody has called by eye yet, longest waiting first. */
export const callTasks = async ({ em, actor }: Unit<UserActor>): Promise<WaitingItem[]> => {
  const own = ownOpenAthletes(actor);
  const rows = await em.execute<CallRow[]>(
    `select ${ATHLETE}, min(c.uploaded_at) as at, v.id as visit_id, filmed.side
     from visit v
     join athlete a on a.id = v.athlete_id
     join clip c on c.visit_id = v.id and c.state = 'ready'
     join lateral (
       select support_side as side from rep where rep.clip_id = c.id
       union select c.support_side where c.support_side is not null
     ) filmed on true
     where ${own.sql}
       and not exists (select from call where call.visit_id = v.id and call.side = filmed.side)
     group by a.id, v.id, filmed.side order by at limit ${AT_MOST}`,
    [...own.params],
  );
  return rows.map((row) => ({
    kind: 'call-missing',
    visitId: row.visit_id,
    side: row.side,
    ...whoAndWhen(row),
  }));
};

/** Reps on which no frame is marked, and clips in which no rep is named, longest waiting first. */
export const repTasks = async ({ em, actor }: Unit<UserActor>): Promise<WaitingItem[]> => {
  const own = ownOpenAthletes(actor);
  const rows = await em.execute<RepRow[]>(
    `select ${ATHLETE}, c.uploaded_at as at, c.id as clip_id, r.number, coalesce(r.support_side, c.support_side) as side
     from clip c
     join visit v on v.id = c.visit_id
     join athlete a on a.id = v.athlete_id
     left join (
       select id, clip_id, support_side, excluded,
         row_number() over (partition by clip_id order by start_frame, created_at, id)::int as number
       from rep
     ) r on r.clip_id = c.id
     where c.state = 'ready' and ${own.sql} and r.excluded is null
       and not exists (select from mark where mark.rep_id = r.id and mark.present)
     order by c.uploaded_at, r.number limit ${AT_MOST}`,
    [...own.params],
  );
  return rows.map((row) => ({
    kind: 'rep-unmarked',
    clipId: row.clip_id,
    repNumber: row.number,
    side: row.side,
    ...whoAndWhen(row),
  }));
};

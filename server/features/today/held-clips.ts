import type { UserActor } from '#shared/access/actors.ts';
import type { TroubleCode } from '#shared/contracts/clips.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { presentTrouble } from '../clips/trouble.ts';
import { AT_MOST, ATHLETE, type Named, type WaitingItem, whoAndWhen } from './scope.ts';

type HeldRow = Named & { clip_id: string; visit_id: string; name: string; trouble: TroubleCode };

/** An owner answers for the machine: clips of other coaches that it gave up on. */
export const heldClipTasks = async ({ em, actor }: Unit<UserActor>): Promise<WaitingItem[]> => {
  if (actor.role !== 'owner') return [];
  const rows = await em.execute<HeldRow[]>(
    `select ${ATHLETE}, c.uploaded_at as at, c.id as clip_id, c.visit_id, c.name, c.trouble
     from clip c join visit v on v.id = c.visit_id join athlete a on a.id = v.athlete_id
     where a.coach_id <> ? and a.deletion_due is null and c.state = 'waiting' and c.trouble is not null and c.next_try_at is null
     order by c.uploaded_at limit ${AT_MOST}`,
    [actor.id],
  );
  return rows.flatMap((row) => {
    const stopped = presentTrouble({ state: 'waiting', trouble: row.trouble, nextTryAt: null });
    if (!stopped) return [];
    const { clip_id: clipId, visit_id: visitId, name } = row;
    const { sentence } = stopped;
    return [{ kind: 'clip-held', clipId, visitId, name, sentence, ...whoAndWhen(row) } as const];
  });
};

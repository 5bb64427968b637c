import type { UserActor } from '#shared/access/actors.ts';
import type { Unit } from '#server/db/in-practice.ts';
import type { TroubleCode } from '#shared/contracts/clips.ts';
import { presentRefusal } from '../clips/refusal.ts';
import { presentTrouble } from '../clips/trouble.ts';
import {
  AT_MOST,
  ATHLETE,
  type Named,
  ownOpenAthletes,
  type WaitingItem,
  whoAndWhen,
} from './scope.ts';

type ClipRow = Named & {
  clip_id: string;
  visit_id: string;
  name: string;
  state: 'waiting' | 'preparing' | 'refused';
  progress: number | null;
  refusal_code: string | null;
  refusal_figures: Record<string, string | number> | null;
  trouble: TroubleCode | null;
  next_try_at: string | null;
};

/** Clips that are on their way, those the machine gave up on, and those that have to be sent or filmed again. */
export const clipTasks = async ({ em, actor }: Unit<UserActor>): Promise<WaitingItem[]> => {
  const own = ownOpenAthletes(actor);
  const rows = await em.execute<ClipRow[]>(
    `select ${ATHLETE}, c.uploaded_at as at, c.id as clip_id, c.visit_id, c.name, c.state, c.progress,
       c.refusal_code, c.refusal_figures, c.trouble, c.next_try_at
     from clip c join visit v on v.id = c.visit_id join athlete a on a.id = v.athlete_id
     where c.state <> 'ready' and ${own.sql} order by c.uploaded_at desc limit ${AT_MOST}`,
    [...own.params],
  );
  return rows.map((row) => {
    const clip = { clipId: row.clip_id, visitId: row.visit_id, name: row.name, ...whoAndWhen(row) };
    const { state, trouble } = row;
    const nextTryAt = row.next_try_at === null ? null : new Date(row.next_try_at);
    const stopped = presentTrouble({ state, trouble, nextTryAt });
    if (stopped && !nextTryAt) return { kind: 'clip-held', sentence: stopped.sentence, ...clip };
    if (state !== 'refused') return { kind: 'clip-preparing', progress: row.progress, ...clip };
    const refusal = presentRefusal(row.refusal_code, row.refusal_figures);
    return { kind: 'clip-refused', sentence: refusal?.sentence ?? 'Film it again.', ...clip };
  });
};

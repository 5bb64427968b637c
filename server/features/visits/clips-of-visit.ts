import type { UserActor } from '#shared/access/actors.ts';
import type { Clip as ClipShape } from '#shared/contracts/clips.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { Clip } from '../clips/clip.entity.ts';
import { presentClip } from '../clips/clips.presenter.ts';
import { visitInSight } from './visit-in-sight.ts';

/** The clips of a visit in the order in which they came. */
export const clipsOfVisit = async (
  unit: Unit<UserActor>,
  visitId: string,
): Promise<ClipShape[]> => {
  const { em } = unit;
  await visitInSight(unit, visitId, 'athlete.read');
  const clips = await em.find(
    Clip,
    { visit: visitId },
    { orderBy: { uploadedAt: 'asc', id: 'asc' }, populate: ['uploadedBy'] },
  );
  const counts = await em.execute<{ clip_id: string; reps: number }[]>(
    `select clip_id, count(*)::int as reps from rep
     where clip_id in (select id from clip where visit_id = ?) group by clip_id`,
    [visitId],
  );
  const repsOf = new Map(counts.map(({ clip_id, reps }) => [clip_id, reps]));
  return clips.map((clip) => presentClip(clip as Clip, repsOf.get(clip.id) ?? 0));
};

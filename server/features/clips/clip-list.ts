import type * as z from 'zod';
import type { UserActor } from '#shared/access/actors.ts';
import type { clipRoutes } from '#shared/contracts/clip-routes.ts';
import type { ClipRow } from '#shared/contracts/clips.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { need } from '../../http/need.ts';
import { openInSightSql } from '../athletes/consent-gate.ts';

export type ClipListQuery = z.output<(typeof clipRoutes)['listClips']['query']>;

interface Row extends Omit<ClipRow, 'athlete' | 'uploadedAt'> {
  readonly athleteId: string;
  readonly athleteName: string;
  readonly uploadedAt: Date;
}

/** Reps and marks are counted for the clips of the page alone. */
const PAGE = (where: string) => `
  with wanted as (
    select c.id, c.visit_id, c.name, c.state, c.view, c.support_side, c.duration_seconds, c.uploaded_at,
      v.day, a.id as athlete_id, a.given_name || ' ' || a.family_name as athlete_name
    from clip c join visit v on v.id = c.visit_id join athlete a on a.id = v.athlete_id
    where ${where}
    order by c.uploaded_at desc, c.id limit ? offset ?
  )
  select w.id, w.visit_id as "visitId", w.name, w.state, w.view, w.support_side as "supportSide",
    w.duration_seconds as "durationSeconds", w.uploaded_at as "uploadedAt", w.day::text as "visitDay",
    w.athlete_id as "athleteId", w.athlete_name as "athleteName",
    (select count(*)::int from rep r where r.clip_id = w.id) as "repCount",
    (select count(distinct (m.rep_id, m.frame))::int from rep r join mark m on m.rep_id = r.id
      where r.clip_id = w.id and m.present) as "markedFrames"
  from wanted w order by w.uploaded_at desc, w.id`;

/** The clips that this person may see, newest first. */
export const listClips = async (
  { em, actor }: Unit<UserActor>,
  { state, athleteId, page, pageSize }: ClipListQuery,
): Promise<{ items: ClipRow[]; total: number; page: number; pageSize: number }> => {
  need(actor, 'practice.read', { kind: 'practice', practiceId: actor.practiceId });
  const sight = openInSightSql(actor);
  const parts = [sight.sql];
  const params: (string | number)[] = [...sight.params];
  if (state !== undefined) {
    parts.push('c.state = ?');
    params.push(state);
  }
  if (athleteId !== undefined) {
    parts.push('v.athlete_id = ?');
    params.push(athleteId);
  }
  const where = parts.join(' and ');
  const [count] = await em.execute<{ total: number }[]>(
    `select count(*)::int as total from clip c join visit v on v.id = c.visit_id
      join athlete a on a.id = v.athlete_id where ${where}`,
    params,
  );
  const rows = await em.execute<Row[]>(PAGE(where), [...params, pageSize, (page - 1) * pageSize]);
  return {
    items: rows.map(({ athleteId: id, athleteName: name, uploadedAt, ...row }) => ({
      ...row,
      athlete: { id, name },
      uploadedAt: new Date(uploadedAt).toISOString(),
    })),
    total: count?.total ?? 0,
    page,
    pageSize,
  };
};

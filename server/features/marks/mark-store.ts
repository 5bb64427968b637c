import type { EntityManager } from '@mikro-orm/postgresql';
import type { Mark } from '#shared/contracts/reps.ts';

/** A stored mark with its place, as SQL returns it. */
export interface MarkRow {
  readonly repId: string;
  readonly frame: number;
  readonly landmark: string;
  readonly present: boolean;
  readonly hidden: boolean;
  readonly u: number | null;
  readonly v: number | null;
  readonly source: 'hand' | 'tracked';
  readonly looked: boolean;
  readonly confidence: number | null;
  readonly pictureLongEdge: number;
  readonly revision: number;
  readonly byUser: string;
  readonly byName: string;
  readonly at: Date;
}

/** Postgres's text form of an array of ids. */
export const uuidArray = (ids: readonly string[]): string => `{${ids.join(',')}}`;

const COLUMNS = `m.rep_id as "repId", m.frame, m.landmark, m.present, m.hidden, m.u, m.v, m.source, m.looked,
  m.confidence, m.picture_long_edge as "pictureLongEdge", m.revision, m.by_user as "byUser", a.name as "byName", m.at`;

/**
 * The marks of some reps by rep, frame and landmark. Raw SQL: reading 20,000 marks as entities takes seconds.
 * Removed marks are left out.
 */
export const readMarks = (em: EntityManager, repIds: readonly string[]): Promise<MarkRow[]> =>
  repIds.length === 0
    ? Promise.resolve([])
    : em.execute<MarkRow[]>(
        `select ${COLUMNS} from mark m join account a on a.id = m.by_user
          where m.rep_id = any (?::uuid[]) and m.present order by m.rep_id, m.frame, m.landmark`,
        [uuidArray(repIds)],
      );

/** One mark as it stands, removed ones too, locked until the unit of work ends. */
export const lockMarks = (
  em: EntityManager,
  repId: string,
  places: readonly { readonly frame: number; readonly landmark: string }[],
): Promise<MarkRow[]> =>
  em.execute<MarkRow[]>(
    `select ${COLUMNS} from mark m join account a on a.id = m.by_user
      where m.rep_id = ? and (m.frame, m.landmark) in (
        select * from unnest(?::int[], ?::text[]))
      for update of m`,
    [
      repId,
      `{${places.map(({ frame }) => frame).join(',')}}`,
      `{${places.map(({ landmark }) => `"${landmark}"`).join(',')}}`,
    ],
  );

/** How many frames of each rep carry a mark. */
export const countMarkedFrames = async (
  em: EntityManager,
  repIds: readonly string[],
): Promise<ReadonlyMap<string, number>> => {
  if (repIds.length === 0) return new Map();
  const rows = await em.execute<{ repId: string; frames: number }[]>(
    `select rep_id as "repId", count(distinct frame)::int as frames from mark
      where rep_id = any (?::uuid[]) and present group by rep_id`,
    [uuidArray(repIds)],
  );
  return new Map(rows.map(({ repId, frames }) => [repId, frames]));
};

/** Writes marks over what is there, many in one statement. */
export const writeMarks = async (
  em: EntityManager,
  practiceId: string,
  rows: readonly Omit<MarkRow, 'byName'>[],
): Promise<void> => {
  if (rows.length === 0) return;
  await em.execute(
    `insert into mark (rep_id, practice_id, frame, landmark, present, hidden, u, v, source, looked, confidence,
        picture_long_edge, revision, by_user, at)
      select r."repId", ?::uuid, r.frame, r.landmark, r.present, r.hidden, r.u, r.v, r.source, r.looked, r.confidence,
        r."pictureLongEdge", r.revision, r."byUser", r.at
      from jsonb_to_recordset(?::jsonb) as r ("repId" uuid, frame int, landmark text, present boolean, hidden boolean,
        u double precision, v double precision, source text, looked boolean, confidence double precision,
        "pictureLongEdge" int, revision int, "byUser" uuid, at timestamptz)
      on conflict (rep_id, frame, landmark) do update set
        present = excluded.present, hidden = excluded.hidden, u = excluded.u, v = excluded.v,
        source = excluded.source, looked = excluded.looked, confidence = excluded.confidence,
        picture_long_edge = excluded.picture_long_edge, revision = excluded.revision,
        by_user = excluded.by_user, at = excluded.at`,
    [practiceId, JSON.stringify(rows)],
  );
};

export const presentMark = (row: MarkRow): Mark => ({
  frame: row.frame,
  landmark: row.landmark,
  u: row.u,
  v: row.v,
  hidden: row.hidden,
  source: row.source,
  looked: row.looked,
  confidence: row.confidence,
  pictureLongEdge: row.pictureLongEdge,
  revision: row.revision,
  by: { id: row.byUser, name: row.byName },
  at: new Date(row.at).toISOString(),
});

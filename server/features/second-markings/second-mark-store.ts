import type { EntityManager } from '@mikro-orm/postgresql';
import { type MarkRow, uuidArray } from '../marks/mark-store.ts';

/** A second mark has the shape of a first one, so that the same commands work on both: always by hand. */
const COLUMNS = `m.second_marking_id as "repId", m.frame, m.landmark, m.present, m.hidden, m.u, m.v, 'hand' as source,
  true as looked, null as confidence, m.picture_long_edge as "pictureLongEdge", m.revision,
  s.marker_id as "byUser", a.name as "byName", m.at`;
const FROM = `second_mark m join second_marking s on s.id = m.second_marking_id join account a on a.id = s.marker_id`;

/** The second marks of some second markings, by frame and landmark; `repId` is the second marking's id. */
export const readSecondMarks = (
  em: EntityManager,
  ids: readonly string[],
  { removed = false }: { readonly removed?: boolean } = {},
): Promise<MarkRow[]> =>
  ids.length === 0
    ? Promise.resolve([])
    : em.execute<MarkRow[]>(
        `select ${COLUMNS} from ${FROM} where m.second_marking_id = any (?::uuid[])
          ${removed ? '' : 'and m.present'} order by m.second_marking_id, m.frame, m.landmark`,
        [uuidArray(ids)],
      );

/** Writes second marks over what is there, many in one statement. */
export const writeSecondMarks = async (
  em: EntityManager,
  rows: readonly MarkRow[],
): Promise<void> => {
  if (rows.length === 0) return;
  await em.execute(
    `insert into second_mark (second_marking_id, practice_id, frame, landmark, present, hidden, u, v,
        picture_long_edge, revision, at)
      select r."repId", current_practice(), r.frame, r.landmark, r.present, r.hidden, r.u, r.v, r."pictureLongEdge",
        r.revision, r.at
      from jsonb_to_recordset(?::jsonb) as r ("repId" uuid, frame int, landmark text, present boolean, hidden boolean,
        u double precision, v double precision, "pictureLongEdge" int, revision int, at timestamptz)
      on conflict (second_marking_id, frame, landmark) do update set
        present = excluded.present, hidden = excluded.hidden, u = excluded.u, v = excluded.v,
        picture_long_edge = excluded.picture_long_edge, revision = excluded.revision, at = excluded.at`,
    [JSON.stringify(rows)],
  );
};

/** Which of these commands were done before. */
export const secondCommandsDone = async (
  em: EntityManager,
  id: string,
  commandIds: readonly string[],
): Promise<ReadonlySet<string>> => {
  const rows = await em.execute<{ id: string }[]>(
    'select id from second_mark_command where second_marking_id = ? and id = any (?::uuid[])',
    [id, uuidArray(commandIds)],
  );
  return new Set(rows.map((row) => row.id));
};

export const rememberSecondCommands = async (
  em: EntityManager,
  id: string,
  commandIds: readonly string[],
): Promise<void> => {
  if (commandIds.length === 0) return;
  await em.execute(
    `insert into second_mark_command (second_marking_id, practice_id, id, at)
      select ?::uuid, current_practice(), each, now() from unnest(?::uuid[]) as each`,
    [id, uuidArray(commandIds)],
  );
};

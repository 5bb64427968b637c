import type { EntityManager } from '@mikro-orm/postgresql';

export type HeldRow = Record<string, unknown>;
export type HeldRows = ReadonlyMap<string, readonly HeldRow[]>;

type Link = { child: string; column: string; parent: string };

/** Proofs of a secret: of no use to the person, and of use to a thief. */
const SECRET = ['token_hash', 'pass_phrase_hash'];

/** Foreign keys that delete with their parent: what hangs on what, as the database itself knows it. */
const links = (em: EntityManager): Promise<Link[]> =>
  em.execute<Link[]>(
    `select child.relname as child, a.attname as "column", parent.relname as parent
     from pg_constraint k
     join pg_class child on child.oid = k.conrelid
     join pg_class parent on parent.oid = k.confrelid
     join pg_attribute a on a.attrelid = k.conrelid and a.attnum = any (k.conkey)
     where k.contype = 'f' and k.confdeltype = 'c' and a.attname <> 'practice_id'
       and child.relnamespace = 'public'::regnamespace
     order by child.relname, a.attname`,
  );

const rowsBy = async (
  em: EntityManager,
  { child, column }: Link,
  ids: readonly string[],
): Promise<HeldRow[]> => {
  // names come from the catalogue, never from a person
  const rows = await em.execute<{ row: HeldRow }[]>(
    `select to_jsonb(t) - ?::text[] as row from "${child}" t where "${column}" = any (?::uuid[])`,
    [`{${SECRET.join(',')}}`, `{${ids.join(',')}}`],
  );
  return rows.map(({ row }) => row);
};

const keyOf = (row: HeldRow): string => JSON.stringify(row.id ?? row);

/**
 * Every row that hangs on an athlete, table by table: found by the foreign keys, so that a table that comes later is
 * found too.
 */
export const heldRows = async (em: EntityManager, athleteId: string): Promise<HeldRows> => {
  const known = await links(em);
  const held = new Map<string, Map<string, HeldRow>>();
  const self: Link = { child: 'athlete', column: 'id', parent: 'athlete' };
  let reached = [{ link: self, ids: [athleteId] as readonly string[] }];
  while (reached.length > 0) {
    const next: typeof reached = [];
    for (const { link, ids } of reached) {
      const of = held.get(link.child) ?? new Map<string, HeldRow>();
      held.set(link.child, of);
      const fresh = (await rowsBy(em, link, ids)).filter((row) => !of.has(keyOf(row)));
      for (const row of fresh) of.set(keyOf(row), row);
      const parents = fresh.flatMap(({ id }) => (typeof id === 'string' ? [id] : []));
      if (parents.length === 0) continue;
      for (const each of known)
        if (each.parent === link.child) next.push({ link: each, ids: parents });
    }
    reached = next;
  }
  return new Map([...held].map(([table, rows]) => [table, [...rows.values()]]));
};

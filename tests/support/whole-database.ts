import { asAdmin } from './admin.ts';
import type { Api } from './api.ts';

const nameOf = ({ ground }: Api): string => new URL(ground.config.database.app).pathname.slice(1);

/** Past every wall, as the superuser of the cluster. */
export const query = (
  api: Api,
  sql: string,
  values: unknown[] = [],
): Promise<Record<string, unknown>[]> =>
  asAdmin(
    async (client) => (await client.query<Record<string, unknown>>(sql, values)).rows,
    nameOf(api),
  );

let everywhere: string | undefined;

/** Which tables hold one of these texts, in whatever column. */
export const foundInDatabase = async (api: Api, texts: readonly string[]): Promise<string[]> => {
  if (everywhere === undefined) {
    const tables = await query(
      api,
      `select quote_ident(table_schema) || '.' || quote_ident(table_name) as name
       from information_schema.tables
       where table_type = 'BASE TABLE' and table_schema not in ('pg_catalog', 'information_schema')`,
    );
    everywhere = tables
      .map(
        ({ name }) =>
          `select '${String(name)}' as name where exists
             (select from ${String(name)} t where t::text like any ($1))`,
      )
      .join(' union all ');
  }
  const rows = await query(api, everywhere, [
    texts.map((text) => `%${text.replaceAll(/[\\%_]/g, '\\$&')}%`),
  ]);
  return rows.map(({ name }) => String(name));
};

import { product } from '#server/db/in-practice.ts';
import type { Api } from './api.ts';

/** What a refused request may change: who was refused, and when a session was last used. */
const MAY_CHANGE = ['audit_entry', 'session'];

let statement: string | undefined;

/** A fingerprint per table of all that the world's practice has. */
export const everythingIn = ({ ground, world }: Api): Promise<unknown> =>
  ground.inPractice(product(world.practiceId), async ({ em }) => {
    if (statement === undefined) {
      const tables = await em.execute<{ name: string }[]>(
        `select table_name as name from information_schema.columns
         where table_schema = current_schema() and column_name = 'practice_id' order by 1`,
      );
      statement = tables
        .filter(({ name }) => !MAY_CHANGE.includes(name))
        .map(
          ({ name }) =>
            `select '${name}' as name, md5(coalesce(string_agg(t::text, '|' order by t::text), '')) as is from "${name}" t`,
        )
        .join(' union all ');
    }
    return em.execute(statement);
  });

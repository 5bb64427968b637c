import type * as z from 'zod';
import type { UserActor } from '#shared/access/actors.ts';
import type { athleteListQuery } from '#shared/contracts/athletes.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { need } from '../../http/need.ts';
import {
  type AthleteRow,
  type CoachRow,
  countAthletes,
  readAthletes,
  readCoaches,
  type Where,
} from './athlete-rows.ts';
import { inSightSql } from './caseload.ts';
import { counting } from './consent-check.ts';
import { today } from './days.ts';

export type AthleteListQuery = z.infer<typeof athleteListQuery>;

export interface Page<T> {
  readonly items: readonly T[];
  readonly total: number;
  readonly page: number;
  readonly pageSize: number;
}

/** The id at the end makes every order total, so that no athlete stands on two pages. */
const ORDERS: Record<AthleteListQuery['sort'], string> = {
  name: 'lower(a.family_name), lower(a.given_name), a.id',
  '-name': 'lower(a.family_name) desc, lower(a.given_name) desc, a.id',
  lastVisit: 'v.last_visit nulls first, a.id',
  '-lastVisit': 'v.last_visit desc nulls last, a.id',
};

/** A consent to filming and assessment that counts on this day. */
const consentedOn = (on: string): Where => {
  const { sql, params } = counting(on);
  return {
    sql: `exists (
      select from consent x where x.athlete_id = a.id and ${sql} and 'assessment' = any (x.held)
    )`,
    params,
  };
};

const asPattern = (word: string): string => `%${word.replaceAll(/[\\%_]/g, '\\$&')}%`;

const whereOf = (actor: UserActor, { q, coach, consent }: AthleteListQuery): Where => {
  const parts: Where[] = [inSightSql(actor, 'a.coach_id')];
  // Every word must be found somewhere in the name, in whichever order it was typed.
  for (const word of q.split(/\s+/).filter(Boolean)) {
    parts.push({ sql: `a.given_name || ' ' || a.family_name ilike ?`, params: [asPattern(word)] });
  }
  if (coach !== undefined) parts.push({ sql: 'a.coach_id = ?', params: [coach] });
  if (consent !== undefined) {
    const { sql, params } = consentedOn(today());
    parts.push({ sql: consent === 'valid' ? sql : `not ${sql}`, params });
  }
  return {
    sql: parts.map(({ sql }) => `(${sql})`).join(' and '),
    params: parts.flatMap(({ params }) => params),
  };
};

/** The athletes that this person may see, as asked for. */
export const listAthletes = async (
  { em, actor }: Unit<UserActor>,
  query: AthleteListQuery,
): Promise<Page<AthleteRow> & { readonly coaches: readonly CoachRow[] }> => {
  need(actor, 'practice.read', { kind: 'practice', practiceId: actor.practiceId });
  const where = whereOf(actor, query);
  const { page, pageSize } = query;
  const total = await countAthletes(em, where);
  const items = await readAthletes(em, today(), where, ORDERS[query.sort], {
    limit: pageSize,
    offset: (page - 1) * pageSize,
  });
  const coaches =
    actor.role === 'coach' ? [] : await readCoaches(em, inSightSql(actor, 'a.coach_id'));
  return { items, total, page, pageSize, coaches };
};

import type { EntityManager } from '@mikro-orm/postgresql';
import type * as z from 'zod';
import type { UserActor } from '#shared/access/actors.ts';
import type { ConsentWordingPage, wordingBody } from '#shared/contracts/consents.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { need } from '../../http/need.ts';
import { Problem } from '../../http/problem.ts';
import { User } from '../accounts/user.entity.ts';
import { audit } from '../audit/audit.ts';
import { ConsentWording } from './consent-wording.entity.ts';
import { presentWording } from './wording.presenter.ts';

type Of = Unit<UserActor>;

const ofPractice = ({ practiceId }: UserActor) => ({ kind: 'practice', practiceId }) as const;

/** The version that is read out now. */
export const currentWording = (em: EntityManager): Promise<ConsentWording> =>
  em.findOneOrFail(ConsentWording, {}, { orderBy: { version: 'desc' } });

const givenTo = async (em: EntityManager): Promise<ReadonlyMap<string, number>> => {
  const rows = await em.execute<{ id: string; count: number }[]>(
    'select wording_id as id, count(*)::int as count from consent where wording_id is not null group by wording_id',
  );
  return new Map(rows.map(({ id, count }) => [id, count]));
};

/** Every version, newest first; a practice has at least the first. */
export const wordingPage = async ({ em, actor }: Of): Promise<ConsentWordingPage> => {
  need(actor, 'practice.read', ofPractice(actor));
  const newestFirst = { populate: ['by'], orderBy: { version: 'desc' } } as const;
  const versions = await em.find(ConsentWording, {}, newestFirst);
  const counts = await givenTo(em);
  const history = versions.map((each) => presentWording(each, counts.get(each.id) ?? 0));
  const [current] = history;
  if (!current) throw new Error('A practice has no consent wording.');
  return { current, history };
};

/**
 * Adds a version after the current one.
 * @throws Problem 'edited-meanwhile' where another was made since
 */
export const changeWording = async (
  unit: Of,
  { after, texts, note }: z.output<typeof wordingBody>,
): Promise<ConsentWordingPage> => {
  const { em, actor } = unit;
  need(actor, 'consent-wording.change', ofPractice(actor));
  // two who change it at once change it one after the other
  await em.execute('select 1 from practice where id = ? for update', [actor.practiceId]);
  const current = await currentWording(em);
  if (current.version !== after) throw new Problem('edited-meanwhile');
  const version = em.create(ConsentWording, {
    version: current.version + 1,
    texts,
    note,
    by: em.getReference(User, actor.id),
  });
  audit(unit, 'consent-wording.change', version.id, { version: version.version });
  await em.flush();
  return wordingPage(unit);
};

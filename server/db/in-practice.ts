import type { EntityManager, MikroORM } from '@mikro-orm/postgresql';
import { PRACTICE_FILTER } from './columns.ts';

/** The product itself at work on a practice's rows: jobs and the demo. Never asked `can`. */
export interface ProductActor {
  readonly kind: 'product';
  readonly practiceId: string;
}
export const product = (practiceId: string): ProductActor => ({ kind: 'product', practiceId });

/** What a service gets: the entities of one practice inside one transaction, and who asks. */
export interface Unit<A> {
  readonly em: EntityManager;
  readonly actor: A;
}

/**
 * Does one unit of work in one transaction: both walls stand around it, the ORM's filter and the database's
 * row-level security, and everything is flushed once at the end. The connection is held until `work` ends, so
 * never stream to a client in it: look up, leave, then stream.
 */
export type InPractice = <A extends { readonly practiceId: string }, T>(
  actor: A,
  work: (unit: Unit<A>) => Promise<T>,
) => Promise<T>;

export const makeInPractice =
  (orm: MikroORM): InPractice =>
  (actor, work) =>
    orm.em.fork().transactional(
      async (em) => {
        em.setFilterParams(PRACTICE_FILTER, { practice: actor.practiceId });
        await em.execute(`select set_config('app.practice', ?, true)`, [actor.practiceId]);
        return work({ em, actor });
      },
      { clear: true },
    );

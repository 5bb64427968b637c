import { randomUUID } from 'node:crypto';
import { type EntityManager, p } from '@mikro-orm/core';

/** Name of the tenancy filter and of its one parameter. */
export const PRACTICE_FILTER = 'practice';

/** The practice that this entity manager works for. Throws outside `inPractice`. */
export const practiceOf = (em: EntityManager): string => {
  const practice: unknown = em.getFilterParams(PRACTICE_FILTER)?.practice;
  if (typeof practice !== 'string') {
    throw new Error('No practice is set: write inside inPractice().');
  }
  return practice;
};

/** What every row has: an id of its own and the one practice it belongs to. */
export const ownedRow = () => ({
  id: p
    .uuid()
    .primary()
    .onCreate(() => randomUUID()),
  practiceId: ownPractice(),
});

/** The practice of a row, filled in from the unit of work that makes it. */
export const ownPractice = () => p.uuid().onCreate((_row, em) => practiceOf(em));

/** A moment to the millisecond. */
export const moment = () => p.datetime(3);

/** The moment at which the row was made. */
export const madeAt = () => moment().onCreate(() => new Date());

/** A 64-bit floating point number: degrees, millimetres, pixels. */
export const real = () => p.double().$type<number>();

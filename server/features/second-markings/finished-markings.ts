import type { EntityManager } from '@mikro-orm/postgresql';
import { type MarkError } from '#shared/measures/inputs.ts';
import type { SecondResult } from '#shared/reliability/compare-markings.ts';
import { markErrorOf } from '#shared/reliability/mark-repeat.ts';
import { doublyMarkedOf, type FinishedMarks } from '#shared/reliability/summary.ts';
import { uuidArray } from '../marks/mark-store.ts';

/** A finished second marking with its result. */
export interface Finished {
  readonly repId: string;
  readonly markerId: string;
  readonly result: SecondResult;
}

/** Every finished second marking of the practice, or those of some markers, oldest first. */
export const finishedMarkings = (
  em: EntityManager,
  markers: readonly string[] | null,
): Promise<Finished[]> =>
  em.execute<Finished[]>(
    `select rep_id as "repId", marker_id as "markerId", result from second_marking
      where finished_at is not null ${markers ? 'and marker_id = any (?::uuid[])' : ''}
      order by finished_at, id`,
    markers ? [uuidArray(markers)] : [],
  );

/** The marks of which one person placed the first and the other the second. */
export const marksBetween = (
  finished: readonly Finished[],
  firstId: string,
  secondId: string,
): FinishedMarks[] =>
  finished
    .filter(({ markerId }) => markerId === secondId)
    .map(({ repId, result }) => ({
      repId,
      mmPerPx: result.mmPerPx,
      marks: result.marks.filter(({ firstBy }) => firstBy === firstId),
    }))
    .filter(({ marks }) => marks.length > 0);

/** The marking error of a person: their own from twenty frames marked twice on, the assumed one before. */
export const ownErrorOf = (finished: readonly Finished[], id: string): MarkError =>
  markErrorOf(doublyMarkedOf(marksBetween(finished, id, id)));

import type { VisitRow } from '#shared/contracts/visits.ts';
import { shortDay } from '#src/ui/days.ts';
import type { End } from '../ends.ts';

/** A side of a visit that has a reading, newest visit first. */
export interface MeasuredSide {
  readonly end: End;
  readonly day: string;
  readonly label: string;
}

export const measuredSides = (visits: readonly VisitRow[]): MeasuredSide[] =>
  visits.flatMap(({ id, day, sides }) =>
    sides.flatMap(({ side, reading }) =>
      reading ? [{ end: { visitId: id, side, repId: null }, day, label: reading.label }] : [],
    ),
  );

export interface Suggestion {
  readonly words: string;
  readonly first: End;
  readonly second: End;
}

/** Both sides of each visit, each side's latest visit against the one before, and two reps of the newest side. */
export const suggestions = (sides: readonly MeasuredSide[]): Suggestion[] => {
  const pairs: Suggestion[] = [];
  for (const [n, { end, day }] of sides.entries()) {
    const before = sides.slice(n + 1).find(({ end: other }) => other.side === end.side);
    if (before && before.end.visitId !== end.visitId)
      pairs.push({
        words: `Standing on the ${end.side}: ${shortDay(before.day)}, then ${shortDay(day)}`,
        first: before.end,
        second: end,
      });
    const other = sides.find(
      ({ end: each }) => each.visitId === end.visitId && each.side !== end.side,
    );
    if (other && end.side === 'right')
      pairs.push({
        words: `Both sides on ${shortDay(day)}: right, then left`,
        first: end,
        second: other.end,
      });
  }
  const [newest] = sides;
  if (newest)
    pairs.push({
      words: `Two reps of ${shortDay(newest.day)}, standing on the ${newest.end.side}`,
      first: newest.end,
      second: newest.end,
    });
  return pairs.slice(0, 8);
};

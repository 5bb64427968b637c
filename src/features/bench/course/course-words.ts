import type { CourseFrame } from '#shared/course/types.ts';
import { degrees, turn } from '#src/ui/figures.ts';
import type { Gates } from '#shared/protocol/protocol.ts';

/** The course for those who cannot see it: how far it goes and what it does between the gates. */
export const courseLabel = (
  frames: readonly CourseFrame[],
  repNumber: number,
  { from, to }: Gates,
): string => {
  const known = frames.filter((each) => each.phase === 'rise' && each.turn !== null);
  if (known.length === 0) return `Course of rep ${repNumber}: nothing measured yet.`;
  const lifts = known.flatMap((each) => (each.lift === null ? [] : [each.lift]));
  const near = (lift: number) =>
    known.reduce<CourseFrame | null>((best, each) => {
      if (each.lift === null || Math.abs(each.lift - lift) > 12) return best;
      const known = best?.lift ?? null;
      return known !== null && Math.abs(known - lift) <= Math.abs(each.lift - lift) ? best : each;
    }, null);
  const at = (lift: number) => {
    const frame = near(lift);
    return !frame || frame.lift === null || frame.turn === null
      ? null
      : `at ${degrees(frame.lift, 0)} of lift ${turn(frame.turn)}`;
  };
  return [
    `Course of rep ${repNumber}: turn of the support hip over ${known.length} marked frames, lift ${degrees(Math.min(...lifts), 0)} to ${degrees(Math.max(...lifts), 0)}`,
    at(from),
    at(to),
  ]
    .filter((part) => part !== null)
    .join('; ');
};

import type { Change, ReadingFigures, RepResult } from '#shared/reading/types.ts';
import type { Degrees } from '#shared/geometry/units.ts';
import { repHalfWidth } from '#shared/reading/at-lift.ts';

/**
 * ± (95 %) of the pelvis or the thigh part, degrees. The engine gives a part only its random error; the
 * systematic one of the whole turn is added to each in full, since it is not known which part carries it.
 */
export const partHalfWidth = ({ uS }: ReadingFigures, part: Change): number =>
  1.96 * Math.hypot(part.u, uS);

/** Whether a part can be told from none. */
export const isTold = (figures: ReadingFigures, part: Change): boolean =>
  Math.abs(part.value) > partHalfWidth(figures, part);

/**
 * ± (95 %) of one rep's pelvis or thigh part, degrees: its own random error and, in full for each part, what the
 * rep's whole change has beyond its random error.
 */
export const repPartHalfWidth = (rep: RepResult, part: Change, gateTo: Degrees): number => {
  const whole = repHalfWidth(rep, gateTo) / 1.96;
  const systematic = Math.max(0, whole ** 2 - (rep.fit?.change.u ?? 0) ** 2);
  return 1.96 * Math.sqrt(part.u ** 2 + systematic);
};

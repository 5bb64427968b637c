import type { Change, ReadingFigures } from '#shared/reading/types.ts';

/**
 * ± (95 %) of the pelvis or the thigh part, degrees. The engine gives a part only its random error; the
 * systematic one of the whole turn is added to each in full, since it is not known which part carries it.
 */
export const partHalfWidth = ({ uS }: ReadingFigures, part: Change): number =>
  1.96 * Math.hypot(part.u, uS);

/** Whether a part can be told from none. */
export const isTold = (figures: ReadingFigures, part: Change): boolean =>
  Math.abs(part.value) > partHalfWidth(figures, part);

import type { LandmarkId } from '#shared/landmarks/types.ts';
import type { CourseFrame } from './types.ts';

/**
 * Degrees of lift from which the foot is surely off the floor: it leaves it at 10–20° and comes back
 * there. From our model, no source.
 */
const CLEAR_OF_THE_FLOOR = 40;

/**
 * Whether the place of a landmark on a frame can change the reading. The ankles say when the foot
 * leaves the floor and comes back; with the thigh well up neither lift nor turn rests on them.
 * @param frame null where no course is known: then everything counts
 */
export const carriesWeight = (
  id: LandmarkId,
  frame: Pick<CourseFrame, 'lift'> | null | undefined,
): boolean =>
  (id !== 'ankle-lifted' && id !== 'ankle-support') || (frame?.lift ?? 0) < CLEAR_OF_THE_FLOOR;

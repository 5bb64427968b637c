import type { LandmarkId } from '#shared/landmarks/types.ts';
import type { LevelFrame } from './level.ts';
import type { Missing } from './missing.ts';

/** What a frame lacks of the landmarks a value needs, or null where it has them all. */
export const lacks = (frame: LevelFrame, needed: readonly LandmarkId[]): Missing | null => {
  const hidden = needed.filter((id) => frame.hidden.includes(id));
  if (hidden.length > 0) return { code: 'landmark-hidden', landmarks: hidden };
  const absent = needed.filter((id) => !frame.marks[id]);
  return absent.length > 0 ? { code: 'landmark-not-marked', landmarks: absent } : null;
};

/** True where one of the marks is tracked and nobody has looked at it. */
export const restsOnHollow = (frame: LevelFrame, needed: readonly LandmarkId[]): boolean =>
  needed.some((id) => frame.marks[id]?.hollow === true);

import type * as z from 'zod';
import type { Boundaries, Rep, repEdit } from '#shared/contracts/reps.ts';

/** An edit of a rep without its version, which is taken from the newest document when it is sent. */
export type RepChange = Omit<z.input<typeof repEdit>, 'version'>;

const handFrame = (boundaries: Boundaries, moment: keyof Boundaries): number | null => {
  const boundary = boundaries[moment];
  return boundary?.by === 'hand' ? boundary.frame : null;
};

/** What brings a rep back to how it is now, after `change`. */
export const inverseOfChange = (rep: Rep, change: RepChange): RepChange => {
  const inverse: RepChange = {};
  if (change.supportSide !== undefined) inverse.supportSide = rep.supportSide;
  if (change.startFrame !== undefined) inverse.startFrame = rep.startFrame;
  if (change.endFrame !== undefined) inverse.endFrame = rep.endFrame;
  if (change.excluded !== undefined) inverse.excluded = rep.excluded;
  if (change.excludedNote !== undefined) inverse.excludedNote = rep.excludedNote;
  if (change.quietFrom !== undefined) inverse.quietFrom = rep.quietFrom;
  if (change.liftFrom !== undefined) inverse.liftFrom = rep.liftFrom;
  if (change.clapFrame !== undefined) inverse.clapFrame = rep.clapFrame;
  if (change.boundaries !== undefined) {
    const moments = Object.keys(change.boundaries) as (keyof Boundaries)[];
    inverse.boundaries = Object.fromEntries(
      moments.map((moment) => [moment, handFrame(rep.boundaries, moment)]),
    );
  }
  return inverse;
};

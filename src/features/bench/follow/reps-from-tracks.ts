import type { BenchDocument } from '#shared/contracts/bench.ts';
import type { AnkleTracks } from '#shared/course/ankle-lifts.ts';
import { findReps, type FoundRep, type NoReps } from '#shared/course/find-reps.ts';
import { spotOf } from '#shared/landmarks/spots.ts';
import type { Side } from '#shared/landmarks/types.ts';
import { viewOf } from '#shared/records/views.ts';
import type { Milliseconds } from '#shared/timing/units.ts';
import type { Tracks } from './following.ts';

/** How tall people are, mm, and how much of the picture's height they fill: without a scale this must do. */
const USUAL_HEIGHT_MM = 1700;
const USUAL_SHARE = 0.7;

/** Which leg an ankle belongs to does not depend on the view; its name in a rep does. */
const ankle = (side: Side, { cameraStood }: BenchDocument['clip']) =>
  spotOf('ankle-support', { supportSide: side, view: viewOf(cameraStood, side) });

/** The reps that the ankles' tracks show, but for those that lie in a named rep already. */
export const repsFromTracks = (
  document: BenchDocument,
  tracks: Tracks,
  times: readonly Milliseconds[],
): readonly FoundRep[] | NoReps => {
  const { clip, reps } = document;
  const points = (side: Side): AnkleTracks['left'] => {
    const places = tracks.get(ankle(side, clip));
    return times.map((_, frame) => places?.[frame]?.point ?? null);
  };
  const guess = USUAL_HEIGHT_MM / (USUAL_SHARE * (clip.height ?? 1));
  const found = findReps(
    { times, left: points('left'), right: points('right') },
    clip.mmPerPx ?? guess,
  );
  if ('code' in found) return found;
  return found.filter(
    ({ footOff, footDown }) =>
      !reps.some(({ rep }) => rep.startFrame <= footDown && footOff <= rep.endFrame),
  );
};

import type { MarkValue, PointValue } from '#shared/landmarks/commands.ts';
import { type SpotId, spotOf } from '#shared/landmarks/spots.ts';
import { LANDMARK_IDS } from '#shared/landmarks/types.ts';
import type { FrameIndex } from '#shared/timing/units.ts';
import type { Keyframe } from '#src/tracking/types.ts';
import type { BenchRep } from '../model/bench-model.ts';
import type { Touches } from '../model/draft.ts';

/** Placed by a hand, or seen by a person and found right: it is followed from here and never moved. */
export const isKeyframe = (value: MarkValue | undefined): value is PointValue =>
  value?.to === 'point' && (value.source === 'hand' || value.looked);

/** By place on the body, every frame on which a person has said where it is, rising. */
export const keyframesOf = (
  reps: readonly BenchRep[],
): ReadonlyMap<SpotId, readonly Keyframe[]> => {
  const found = new Map<SpotId, Map<FrameIndex, Keyframe>>();
  for (const { rep, marks } of reps)
    for (const [frame, here] of marks)
      for (const id of LANDMARK_IDS) {
        const value = here[id];
        if (!isKeyframe(value)) continue;
        const spot = spotOf(id, rep);
        const frames = found.get(spot) ?? new Map<FrameIndex, Keyframe>();
        frames.set(frame, { frame, point: value.point });
        found.set(spot, frames);
      }
  return new Map(
    [...found].map(([spot, frames]) => [
      spot,
      [...frames.values()].sort((a, b) => a.frame - b.frame),
    ]),
  );
};

/** The same of marks placed before there is a rep. */
export const keyframesOfTouches = (touches: Touches): ReadonlyMap<SpotId, readonly Keyframe[]> => {
  const found = new Map<SpotId, Keyframe[]>();
  for (const [frame, spots] of [...touches].sort(([a], [b]) => a - b))
    for (const [spot, value] of spots)
      if (isKeyframe(value))
        found.set(spot, [...(found.get(spot) ?? []), { frame, point: value.point }]);
  return found;
};

/** The open span around a frame that holds no other keyframe, both ends inclusive. */
export const spanAround = (
  keyframes: readonly Keyframe[],
  frame: FrameIndex,
  last: number,
): readonly [from: number, to: number] => {
  const before = keyframes.findLast((each) => each.frame < frame);
  const after = keyframes.find((each) => each.frame > frame);
  return [before ? before.frame + 1 : 0, after ? after.frame - 1 : last];
};

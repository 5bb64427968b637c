import type { FramePoint } from '#shared/geometry/points.ts';
import type { MarksByFrame } from '#shared/landmarks/commands.ts';
import type { LandmarkId } from '#shared/landmarks/types.ts';
import type { FrameIndex } from '#shared/timing/units.ts';

/**
 * Where a landmark is looked for on a frame: where it lies on the nearest frame that has it, the
 * earlier one of two. Null where it was never placed. Nothing is ever filled in from this; it only
 * says where to look, and where Enter places without a pointer.
 */
export const expectedPlace = (
  marks: MarksByFrame,
  frame: FrameIndex,
  landmark: LandmarkId,
): FramePoint | null => {
  let best: { readonly away: number; readonly point: FramePoint } | null = null;
  for (const [marked, there] of marks) {
    const mark = there[landmark];
    if (mark?.to !== 'point') continue;
    const away = Math.abs(marked - frame) + (marked > frame ? 0.5 : 0);
    if (!best || away < best.away) best = { away, point: mark.point };
  }
  return best?.point ?? null;
};

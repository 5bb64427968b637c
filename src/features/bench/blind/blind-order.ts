import type { SecondMarkingDocument } from '#shared/contracts/second-markings.ts';
import type { MarksByFrame } from '#shared/landmarks/commands.ts';
import type { LandmarkId } from '#shared/landmarks/types.ts';
import { isLandmark } from '#shared/records/stored-marks.ts';
import { frameIndex, type FrameIndex } from '#shared/timing/units.ts';

/** A frame to be marked again, in the order of the second marking. */
export interface OrderedFrame {
  readonly frame: FrameIndex;
  readonly landmarks: readonly LandmarkId[];
  readonly done: boolean;
}

/** The frames in their order, and which of them are whole. */
export const orderOf = (
  frames: SecondMarkingDocument['frames'],
  marks: MarksByFrame,
): OrderedFrame[] =>
  frames.map(({ frame, landmarks }) => {
    const asked = landmarks.filter(isLandmark);
    const here = marks.get(frameIndex(frame)) ?? {};
    return {
      frame: frameIndex(frame),
      landmarks: asked,
      done: asked.every((id) => here[id] !== undefined),
    };
  });

/** The next frame with something to mark, after the one on show, then from the beginning; null once all are done. */
export const nextToMark = (
  order: readonly OrderedFrame[],
  shown: FrameIndex,
): FrameIndex | null => {
  const from = order.findIndex(({ frame }) => frame === shown) + 1;
  const rest = [...order.slice(from), ...order.slice(0, from)];
  return rest.find(({ done, frame }) => !done && frame !== shown)?.frame ?? null;
};

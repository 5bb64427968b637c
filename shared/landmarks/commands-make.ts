import { framePoint, type FramePoint } from '#shared/geometry/points.ts';
import type { FrameIndex } from '#shared/timing/units.ts';
import { changing, markAt, type MarkingCommand, type MarksByFrame } from './commands.ts';
import { LANDMARK_IDS, type LandmarkId } from './types.ts';

/** The gestures of marking by hand. Each gives the commands of one step of undo, none if idle. */

export interface Placing {
  readonly frame: FrameIndex;
  readonly landmark: LandmarkId;
  readonly point: FramePoint;
  /** Long edge, px, of the picture that the hand saw. */
  readonly pictureLongEdge: number;
}

export const place = (marks: MarksByFrame, placing: Placing): MarkingCommand[] =>
  changing(marks, [
    {
      frame: placing.frame,
      landmark: placing.landmark,
      after: {
        to: 'point',
        point: placing.point,
        source: 'hand',
        looked: true,
        confidence: null,
        pictureLongEdge: placing.pictureLongEdge,
      },
    },
  ]);

export const hide = (
  marks: MarksByFrame,
  frame: FrameIndex,
  landmark: LandmarkId,
): MarkingCommand[] => changing(marks, [{ frame, landmark, after: { to: 'hidden' } }]);

export const remove = (
  marks: MarksByFrame,
  frame: FrameIndex,
  landmark: LandmarkId,
): MarkingCommand[] => changing(marks, [{ frame, landmark, after: null }]);

/** Takes every mark of a frame away. */
export const removeFrame = (marks: MarksByFrame, frame: FrameIndex): MarkingCommand[] =>
  changing(
    marks,
    LANDMARK_IDS.map((landmark) => ({ frame, landmark, after: null })),
  );

/** Moves a placed mark by source pixels; a nudge makes it a mark by hand. None where none is. */
export const nudge = (
  marks: MarksByFrame,
  frame: FrameIndex,
  landmark: LandmarkId,
  by: { readonly du: number; readonly dv: number },
  pictureLongEdge: number,
): MarkingCommand[] => {
  const mark = markAt(marks, frame, landmark);
  if (mark?.to !== 'point') return [];
  return place(marks, {
    frame,
    landmark,
    point: framePoint(mark.point.u + by.du, mark.point.v + by.dv),
    pictureLongEdge,
  });
};

/** Says that a person has looked at the tracked marks of a frame and finds them right. */
export const lookedAt = (marks: MarksByFrame, frame: FrameIndex): MarkingCommand[] =>
  changing(
    marks,
    LANDMARK_IDS.flatMap((landmark) => {
      const mark = markAt(marks, frame, landmark);
      return mark?.to === 'point' ? [{ frame, landmark, after: { ...mark, looked: true } }] : [];
    }),
  );

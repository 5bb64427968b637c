import type { FramePoint } from '#shared/geometry/points.ts';
import { framePoint } from '#shared/geometry/points.ts';
import type { FrameMarks } from '#shared/landmarks/commands.ts';
import { LANDMARK_IDS } from '#shared/landmarks/types.ts';
import { centredOn, fit, type Size, type Viewport } from '#src/canvas/viewport.ts';

/** While a landmark is asked for, a phone shows this share of the picture's width: a finger can aim. */
const AIM_SHARE = 0.5;
/** Room around the marks of a frame that is done. */
const ROOM = 1.35;

const middle = (a: number, b: number) => (a + b) / 2;

/**
 * What a phone shows of the frame: the place of the landmark asked for, else all its marks, else the
 * whole width.
 */
export const narrowView = (
  expected: FramePoint | null,
  marks: FrameMarks,
  frame: Size,
  stage: Size,
): Viewport => {
  if (expected) return centredOn(expected, stage.width / (frame.width * AIM_SHARE), frame, stage);
  const points = LANDMARK_IDS.flatMap((id) => {
    const mark = marks[id];
    return mark?.to === 'point' ? [mark.point] : [];
  });
  const across = stage.width / frame.width;
  if (points.length < 2)
    return centredOn(framePoint(frame.width / 2, frame.height / 2), across, frame, stage);
  const us = points.map((point) => point.u);
  const vs = points.map((point) => point.v);
  const [left, right] = [Math.min(...us), Math.max(...us)];
  const [top, bottom] = [Math.min(...vs), Math.max(...vs)];
  const scale = Math.min(
    stage.width / (ROOM * Math.max(1, right - left)),
    stage.height / (ROOM * Math.max(1, bottom - top)),
  );
  const least = fit(frame, stage).scale;
  return centredOn(
    framePoint(middle(left, right), middle(top, bottom)),
    Math.max(least, Math.min(scale, across / AIM_SHARE)),
    frame,
    stage,
  );
};

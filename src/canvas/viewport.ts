import {
  type FramePoint,
  framePoint,
  type StagePoint,
  stagePoint,
} from '#shared/geometry/points.ts';
import { clamp } from '#shared/geometry/units.ts';
import { type Size, toStage, type Viewport } from '#shared/overlay/viewport.ts';

export { type Size, toStage, type Viewport };

export const longEdgeOf = ({ width, height }: Size): number => Math.max(width, height);

/** The way back from `toStage`; pixels of the source become pixels of the screen there and nowhere else. */
export const toFrame = (viewport: Viewport, point: StagePoint): FramePoint =>
  framePoint((point.x - viewport.x) / viewport.scale, (point.y - viewport.y) / viewport.scale);

/** The whole frame, as large as fits, in the middle. */
export const fit = (frame: Size, stage: Size): Viewport => {
  const scale = Math.min(stage.width / frame.width, stage.height / frame.height);
  return {
    scale,
    x: (stage.width - scale * frame.width) / 2,
    y: (stage.height - scale * frame.height) / 2,
  };
};

/** One source pixel is never drawn larger than this many CSS px. */
export const LARGEST_SCALE = 16;

/** Along one axis: centred where the frame is smaller than the stage, else never a gap at an edge. */
const held = (offset: number, drawn: number, room: number): number =>
  drawn <= room ? (room - drawn) / 2 : clamp(offset, room - drawn, 0);

/** Keeps the frame on the stage and the scale between the whole frame and single pixels. */
export const within = (viewport: Viewport, frame: Size, stage: Size): Viewport => {
  const least = fit(frame, stage).scale;
  const scale = clamp(viewport.scale, least, Math.max(least, LARGEST_SCALE));
  return {
    scale,
    x: held(viewport.x, scale * frame.width, stage.width),
    y: held(viewport.y, scale * frame.height, stage.height),
  };
};

/** Enlarges about a point of the stage, which keeps showing the same place of the frame. */
export const zoomAt = (
  viewport: Viewport,
  at: StagePoint,
  factor: number,
  frame: Size,
  stage: Size,
): Viewport => {
  const least = fit(frame, stage).scale;
  const scale = clamp(viewport.scale * factor, least, Math.max(least, LARGEST_SCALE));
  const place = toFrame(viewport, at);
  return within({ scale, x: at.x - scale * place.u, y: at.y - scale * place.v }, frame, stage);
};

export const panBy = (
  viewport: Viewport,
  by: { readonly dx: number; readonly dy: number },
  frame: Size,
  stage: Size,
): Viewport => within({ ...viewport, x: viewport.x + by.dx, y: viewport.y + by.dy }, frame, stage);

/** Shows a place of the frame in the middle of the stage, at a scale. */
export const centredOn = (point: FramePoint, scale: number, frame: Size, stage: Size): Viewport =>
  within(
    {
      scale,
      x: stage.width / 2 - scale * point.u,
      y: stage.height / 2 - scale * point.v,
    },
    frame,
    stage,
  );

/** The same place in the middle, on a stage that has changed its size. */
export const resized = (viewport: Viewport, before: Size, frame: Size, stage: Size): Viewport => {
  const wasFit = viewport.scale <= fit(frame, before).scale * 1.001;
  if (wasFit) return fit(frame, stage);
  const middle = toFrame(viewport, stagePoint(before.width / 2, before.height / 2));
  return centredOn(middle, viewport.scale, frame, stage);
};

/** True where the prepared copy has fewer pixels than the screen shows: it would blur. */
export const beyondCopy = (
  viewport: Viewport,
  frame: Size,
  copy: Size,
  pixelRatio: number,
): boolean =>
  copy.width < frame.width && viewport.scale * pixelRatio > (copy.width / frame.width) * 1.05;

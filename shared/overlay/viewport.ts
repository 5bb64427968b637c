import { type FramePoint, type StagePoint, stagePoint } from '#shared/geometry/points.ts';

/** How the source frame lies on what is painted on: `stage = offset + scale × frame`. */
export interface Viewport {
  /** Pixels of the stage (CSS px on a page) per source px. */
  readonly scale: number;
  /** Where the frame's top left corner lies on the stage. */
  readonly x: number;
  readonly y: number;
}

export interface Size {
  readonly width: number;
  readonly height: number;
}

export const toStage = (viewport: Viewport, point: FramePoint): StagePoint =>
  stagePoint(viewport.x + viewport.scale * point.u, viewport.y + viewport.scale * point.v);

import { type FramePoint, framePoint } from '#shared/geometry/points.ts';
import type { Place } from './flow.ts';

export interface Size {
  readonly width: number;
  readonly height: number;
}

/**
 * From pixels of the source, counted from the picture's corner, to pixels of the picture looked at,
 * counted from the middle of its first pixel; and back. The one place where the two meet.
 */
export const toPicture = (point: FramePoint, source: Size, picture: Size): Place => ({
  x: (point.u * picture.width) / source.width - 0.5,
  y: (point.v * picture.height) / source.height - 0.5,
});

export const toSource = (place: Place, source: Size, picture: Size): FramePoint =>
  framePoint(
    ((place.x + 0.5) * source.width) / picture.width,
    ((place.y + 0.5) * source.height) / picture.height,
  );

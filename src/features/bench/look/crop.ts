import type { FramePoint } from '#shared/geometry/points.ts';
import type { Size, Viewport } from '#src/canvas/viewport.ts';

/** Room around the marks, of their extent; the head and the feet lie outside them. */
const ROOM = 0.28;

/**
 * Shows the part of a frame around some points on a picture of a given size.
 * @param least the crop is never narrower or lower than this, source px
 */
export const cropAround = (
  points: readonly FramePoint[],
  frame: Size,
  picture: Size,
  least: number,
): Viewport => {
  const us = points.map(({ u }) => u);
  const vs = points.map(({ v }) => v);
  const [left, right] = points.length > 0 ? [Math.min(...us), Math.max(...us)] : [0, frame.width];
  const [top, bottom] = points.length > 0 ? [Math.min(...vs), Math.max(...vs)] : [0, frame.height];
  const width = Math.max(least, (1 + 2 * ROOM) * (right - left));
  const height = Math.max(least, (1 + 2 * ROOM) * (bottom - top));
  const scale = Math.min(picture.width / width, picture.height / height);
  return {
    scale,
    x: picture.width / 2 - (scale * (left + right)) / 2,
    y: picture.height / 2 - (scale * (top + bottom)) / 2,
  };
};

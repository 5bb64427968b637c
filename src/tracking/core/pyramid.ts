import { type Plane, planeOf } from './plane.ts';

/** A piece of a picture at 1/2^n of its size. */
export interface Level {
  readonly plane: Plane;
  /** Pixels of the full picture per pixel here. */
  readonly scale: number;
  /** Where the middle of its first pixel lies in the full picture. */
  readonly x0: number;
  readonly y0: number;
}

/** Level 0 is the picture itself; each further one is half as large. */
export type Pyramid = readonly Level[];

export const toLevelX = (level: Level, x: number): number => (x - level.x0) / level.scale;
export const toLevelY = (level: Level, y: number): number => (y - level.y0) / level.scale;

/**
 * Each value is the mean of two by two, of the columns and rows from `left`, `top` on; all of them
 * lie within the source.
 */
export const halve = (
  source: Plane,
  left: number,
  top: number,
  width: number,
  height: number,
): Plane => {
  const { data, stride } = source;
  const out = new Float32Array(width * height);
  for (let row = 0, k = 0; row < height; row += 1) {
    let at = (top + 2 * row) * stride + left;
    for (let column = 0; column < width; column += 1, k += 1, at += 2)
      out[k] =
        ((data[at] as number) +
          (data[at + 1] as number) +
          (data[at + stride] as number) +
          (data[at + stride + 1] as number)) /
        4;
  }
  return planeOf(out, width, height);
};

/**
 * The pyramid of the square of `reach` about a place, as far as it lies in the picture: what one
 * point needs, whatever the others do. Level 0 is the whole picture, without a copy; a picture too
 * small for the coarsest level has no others.
 */
export const pyramidAround = (
  picture: Plane,
  x: number,
  y: number,
  reach: number,
  levels: number,
): Pyramid => {
  const unit = 2 ** (levels - 1);
  const span = (middle: number, size: number): readonly [from: number, length: number] => {
    const whole = Math.floor(size / unit);
    const first = Math.min(
      Math.max(Math.floor((middle - reach) / unit), 0),
      Math.max(0, whole - 1),
    );
    const last = Math.min(Math.max(Math.ceil((middle + reach) / unit), first + 1), whole);
    return [first * unit, Math.max(0, last - first) * unit];
  };
  const [left, width] = span(x, picture.width);
  const [top, height] = span(y, picture.height);
  const pyramid: Level[] = [{ plane: picture, scale: 1, x0: 0, y0: 0 }];
  if (width === 0 || height === 0) return pyramid;
  let source = picture;
  for (let n = 1; n < levels; n += 1) {
    const scale = 2 ** n;
    const from = n === 1 ? { left, top } : { left: 0, top: 0 };
    source = halve(source, from.left, from.top, width / scale, height / scale);
    // the mean of a pixel's parts lies in the middle of them
    const middle = (scale - 1) / 2;
    pyramid.push({ plane: source, scale, x0: left + middle, y0: top + middle });
  }
  return pyramid;
};

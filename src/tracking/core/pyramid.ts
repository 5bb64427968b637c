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

const EDGE = 1;

/**
 * Every second pixel after smoothing by 1-2-1 both ways, of the columns and rows from `left`, `top`
 * (even) on; beyond the picture its edge goes on.
 */
export const halve = (
  source: Plane,
  left: number,
  top: number,
  width: number,
  height: number,
): Plane => {
  const { data, stride } = source;
  const lastX = source.width - 1;
  const lastY = source.height - 1;
  const out = new Float32Array(width * height);
  const across = new Float32Array(width * 3);
  const smoothRow = (y: number, into: number): void => {
    const at = Math.min(Math.max(y, 0), lastY) * stride;
    for (let k = 0; k < width; k += 1) {
      const x = left + 2 * k;
      const here = at + (x > lastX ? lastX : x);
      const before = x - EDGE < 0 ? at : at + Math.min(x - EDGE, lastX);
      const after = x + EDGE > lastX ? at + lastX : at + x + EDGE;
      across[into * width + k] =
        (data[before] as number) + 2 * (data[here] as number) + (data[after] as number);
    }
  };
  smoothRow(top - EDGE, 0);
  for (let row = 0; row < height; row += 1) {
    const y = top + 2 * row;
    const first = (2 * row) % 3;
    const second = (first + 1) % 3;
    const third = (first + 2) % 3;
    smoothRow(y, second);
    smoothRow(y + EDGE, third);
    for (let k = 0; k < width; k += 1) {
      out[row * width + k] =
        ((across[first * width + k] as number) +
          2 * (across[second * width + k] as number) +
          (across[third * width + k] as number)) /
        16;
    }
  }
  return planeOf(out, width, height);
};

/**
 * The pyramid of the square of `reach` about a place, as far as it lies in the picture: what one
 * point needs, whatever the others do. Level 0 is the whole picture, without a copy.
 */
export const pyramidAround = (
  picture: Plane,
  x: number,
  y: number,
  reach: number,
  levels: number,
): Pyramid => {
  const unit = 2 ** (levels - 1);
  const from = (middle: number, size: number): number =>
    unit * Math.floor(Math.min(Math.max(middle - reach, 0), size - 1) / unit);
  const left = from(x, picture.width);
  const top = from(y, picture.height);
  const right = Math.min(picture.width - 1, Math.max(x + reach, left));
  const bottom = Math.min(picture.height - 1, Math.max(y + reach, top));
  const pyramid: Level[] = [{ plane: picture, scale: 1, x0: 0, y0: 0 }];
  let source = picture;
  let sourceLeft = left;
  let sourceTop = top;
  for (let n = 1; n < levels; n += 1) {
    const scale = 2 ** n;
    const width = Math.floor((right - left) / scale) + 1;
    const height = Math.floor((bottom - top) / scale) + 1;
    source = halve(source, sourceLeft, sourceTop, width, height);
    sourceLeft = 0;
    sourceTop = 0;
    pyramid.push({ plane: source, scale, x0: left, y0: top });
  }
  return pyramid;
};

/**
 * Grey values of a picture or of one level of a pyramid, row by row. Inside the core a place is
 * counted from the middle of the first pixel: (0, 0) is its middle, not its corner.
 */
export interface Plane {
  readonly data: Uint8Array | Float32Array;
  readonly width: number;
  readonly height: number;
  /** Values from one row to the next. */
  readonly stride: number;
}

export const planeOf = (
  data: Plane['data'],
  width: number,
  height: number,
  stride = width,
): Plane => {
  if (!(width > 0 && height > 0 && stride >= width && data.length >= stride * (height - 1) + width))
    throw new RangeError(`${data.length} values are no picture of ${width} by ${height}.`);
  return { data, width, height, stride };
};

/** Between the four pixels around; beyond the picture its edge goes on. */
export const sampleAt = (plane: Plane, x: number, y: number): number => {
  const { data, width, height, stride } = plane;
  const cx = x < 0 ? 0 : x > width - 1 ? width - 1 : x;
  const cy = y < 0 ? 0 : y > height - 1 ? height - 1 : y;
  const column = Math.min(Math.floor(cx), Math.max(0, width - 2));
  const row = Math.min(Math.floor(cy), Math.max(0, height - 2));
  const right = width > 1 ? 1 : 0;
  const below = height > 1 ? stride : 0;
  const fx = cx - column;
  const fy = cy - row;
  const at = row * stride + column;
  const top = (data[at] as number) + fx * ((data[at + right] as number) - (data[at] as number));
  const low =
    (data[at + below] as number) +
    fx * ((data[at + below + right] as number) - (data[at + below] as number));
  return top + fy * (low - top);
};

/** True where a square of `radius` about the place lies within the picture. */
export const holdsSquare = (plane: Plane, x: number, y: number, radius: number): boolean =>
  x - radius >= 0 &&
  y - radius >= 0 &&
  x + radius <= plane.width - 1 &&
  y + radius <= plane.height - 1;

import { type Plane, planeOf } from '../core/plane.ts';

/** Clockwise, degrees. */
export type QuarterTurns = 0 | 90 | 180 | 270;

/** The picture as it is shown: phones store it lying and say how to turn it. */
export const turned = (plane: Plane, by: QuarterTurns): Plane => {
  if (by === 0) return plane;
  const { data, width, height, stride } = plane;
  const [wide, high] = by === 180 ? [width, height] : [height, width];
  const out = new (data instanceof Uint8Array ? Uint8Array : Float32Array)(wide * high);
  for (let y = 0; y < height; y += 1)
    for (let x = 0; x < width; x += 1) {
      const [column, row] =
        by === 90
          ? [height - 1 - y, x]
          : by === 180
            ? [width - 1 - x, height - 1 - y]
            : [y, width - 1 - x];
      out[row * wide + column] = data[y * stride + x] as number;
    }
  return planeOf(out, wide, high);
};

import { colourAt, DOT_DARK, DOT_WHITE } from '../figure/material.ts';
import type { Look } from '../figure/looks.ts';
import { PAINT } from '../figure/paints.ts';
import { type Camera, PICTURE } from '../model/camera.ts';
import { dot, sub } from '../model/vec.ts';
import type { Dot } from './dots.ts';
import type { Box, DepthPicture } from './fill.ts';
import { GROUND, LAMP_COLOUR, type ShadowMap, SKY, TO_LAMP } from './light.ts';
import type { Surfaces } from './surfaces.ts';

export interface ShadeJob {
  readonly surfaces: Surfaces;
  readonly depth: DepthPicture;
  readonly box: Box;
  readonly camera: Camera;
  readonly shadow: ShadowMap;
  readonly look: Look;
  readonly dots: readonly Dot[];
  /** a whole number that turns the shadow's pattern from exposure to exposure */
  readonly turn: number;
  /** linear light, r g b and coverage a pixel; this exposure is added */
  readonly light: Float32Array;
}

interface PlacedDot {
  readonly u: number;
  readonly v: number;
  readonly radius: number;
  readonly far: number;
  readonly parts: readonly number[];
}

/** Sticker thickness through which a point still counts as on it: rounds of limbs, mm. */
const DEEP = 130;

const placeDots = (dots: readonly Dot[], camera: Camera, shift: readonly [number, number]) =>
  dots.map((sticker): PlacedDot => {
    const [u, v] = camera.project(sticker.at);
    const far = dot(sub(sticker.at, camera.eye), camera.ahead);
    return {
      u: u + shift[0],
      v: v + shift[1],
      radius: (sticker.radius * camera.plan.focalPx) / far,
      far,
      parts: sticker.parts,
    };
  });

/** 0 off the sticker, 1 on its white, 2 on its dark middle. */
const onDot = (dots: readonly PlacedDot[], u: number, v: number, far: number, part: number) => {
  for (const { u: du, v: dv, radius, far: depth, parts } of dots) {
    const [x, y] = [u - du, v - dv];
    const r2 = x * x + y * y;
    if (r2 < radius * radius && Math.abs(far - depth) < DEEP && parts.includes(part))
      return r2 < 0.2 * radius * radius ? 2 : 1;
  }
  return 0;
};

const smooth = (from: number, to: number, value: number): number => {
  const t = Math.min(1, Math.max(0, (value - from) / (to - from)));
  return t * t * (3 - 2 * t);
};

const blend = (
  array: Float32Array,
  a: number,
  b: number,
  c: number,
  ma: number,
  mb: number,
  mc: number,
): number => ma * (array[a] as number) + mb * (array[b] as number) + mc * (array[c] as number);

/** Adds the light of every pixel of the person to the picture: calm, broad light and shade, no shine. */
export const shadePerson = (job: ShadeJob, shift: readonly [number, number] = [0, 0]): void => {
  const { surfaces, depth, box, look, shadow, light, camera } = job;
  const { points, normals, places, openness, parts, triangles, paints } = surfaces;
  const { x: sx, y: sy, w: sw, owner } = depth;
  const { width } = PICTURE;
  const dots = placeDots(job.dots, camera, shift);
  for (let row = box.top; row < box.bottom; row += 1) {
    const inRow = dots.filter((placed) => Math.abs(row + 0.5 - placed.v) < placed.radius);
    for (let column = box.left; column < box.right; column += 1) {
      const at = row * width + column;
      const t = owner[at] as number;
      if (t < 0) continue;
      const a = triangles[3 * t] as number;
      const b = triangles[3 * t + 1] as number;
      const c = triangles[3 * t + 2] as number;
      const ax = sx[a] as number;
      const ay = sy[a] as number;
      const bx = (sx[b] as number) - ax;
      const by = (sy[b] as number) - ay;
      const cx = (sx[c] as number) - ax;
      const cy = (sy[c] as number) - ay;
      const inverse = 1 / (bx * cy - by * cx);
      const px = column + 0.5 - ax;
      const py = row + 0.5 - ay;
      const kb = (px * cy - py * cx) * inverse;
      const kc = (py * bx - px * by) * inverse;
      const wa = (1 - kb - kc) * (sw[a] as number);
      const wb = kb * (sw[b] as number);
      const wc = kc * (sw[c] as number);
      const far = 1 / (wa + wb + wc);
      const ma = wa * far;
      const mb = wb * far;
      const mc = wc * far;
      const a3 = 3 * a;
      const b3 = 3 * b;
      const c3 = 3 * c;
      let nx = blend(normals, a3 + 0, b3 + 0, c3 + 0, ma, mb, mc);
      let ny = blend(normals, a3 + 1, b3 + 1, c3 + 1, ma, mb, mc);
      let nz = blend(normals, a3 + 2, b3 + 2, c3 + 2, ma, mb, mc);
      const size = 1 / Math.sqrt(nx * nx + ny * ny + nz * nz);
      nx *= size;
      ny *= size;
      nz *= size;
      const open = blend(openness, a, b, c, ma, mb, mc);
      const part = parts[a] as number;
      const paint = paints[t] as number;
      const sticker = onDot(inRow, column + 0.5, row + 0.5, far, part);
      const tint =
        sticker === 1
          ? DOT_WHITE
          : sticker === 2
            ? DOT_DARK
            : colourAt(
                look,
                paint,
                blend(places, 2 * a + 0, 2 * b + 0, 2 * c + 0, ma, mb, mc),
                blend(places, 2 * a + 1, 2 * b + 1, 2 * c + 1, ma, mb, mc),
              );
      const facing = nx * TO_LAMP[0] + ny * TO_LAMP[1] + nz * TO_LAMP[2];
      let lamp = 0.72 * smooth(-0.22, 0.62, facing) + 0.2 * Math.max(0, facing);
      if (lamp > 0.01) {
        const lift = paint === PAINT.head || paint === PAINT.hair ? 12 : 7;
        lamp *=
          0.12 +
          0.88 *
            shadow.lit(
              blend(points, a3 + 0, b3 + 0, c3 + 0, ma, mb, mc) + nx * lift,
              blend(points, a3 + 1, b3 + 1, c3 + 1, ma, mb, mc) + ny * lift,
              blend(points, a3 + 2, b3 + 2, c3 + 2, ma, mb, mc) + nz * lift,
              26,
              true,
              job.turn + (Math.imul(column * 73 + row * 1231, 0x9e3779b1) >>> 13),
            );
      }
      const sky = 0.5 + 0.5 * nz;
      const into = 4 * at;
      light[into] =
        (light[into] as number) +
        tint[0] * (LAMP_COLOUR[0] * lamp + (GROUND[0] + (SKY[0] - GROUND[0]) * sky) * open);
      light[into + 1] =
        (light[into + 1] as number) +
        tint[1] * (LAMP_COLOUR[1] * lamp + (GROUND[1] + (SKY[1] - GROUND[1]) * sky) * open);
      light[into + 2] =
        (light[into + 2] as number) +
        tint[2] * (LAMP_COLOUR[2] * lamp + (GROUND[2] + (SKY[2] - GROUND[2]) * sky) * open);
      light[into + 3] = (light[into + 3] as number) + 1;
    }
  }
};

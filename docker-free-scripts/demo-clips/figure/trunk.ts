import { type Body, HIP_BEHIND, HIP_BELOW, OUTLINE_BEHIND } from '../model/bodies.ts';
import type { Skeleton } from '../model/skeleton.ts';
import {
  along,
  type Axes,
  cross,
  dot,
  ease,
  mix,
  scale,
  sub,
  unit,
  type Vec,
} from '../model/vec.ts';
import type { Ring, Surfaces } from '../paint/surfaces.ts';
import { NORM_HEIGHT } from './leg.ts';
import { PAINT, PART } from './paints.ts';
import { ringOf, type Section, type Shape, shapeOf } from './profile.ts';

export interface TrunkShapes {
  readonly hips: Shape;
  readonly shirt: Shape;
  readonly neck: Shape;
  readonly belt: Shape;
}

/** Height of the belt's middle over the hip centres is the ASIS's; half its own height, mm. */
const BELT_HALF = 16;

/** The pelvis outline at the ASIS: its middle lies behind the ASIS line by the measured depth. */
const asisSection = (body: Body, size: number): readonly [number, number, number] => {
  const ahead = HIP_BEHIND * body.asisWidth - OUTLINE_BEHIND;
  // front surface meets the ASIS: |y/w|^n + |x/f|^n = 1 for n = 2.5
  const side = (body.asisWidth / 2 / body.pelvisHalfWidth) ** 2.5;
  const front = OUTLINE_BEHIND / (1 - side) ** 0.4;
  return [body.pelvisHalfWidth / size, front / size, ahead / size];
};

export const trunkShapes = (body: Body, fullChest: boolean): TrunkShapes => {
  const size = (body.height / NORM_HEIGHT) * body.girth;
  const [half, front, ahead] = asisSection(body, size);
  const asis = HIP_BELOW * body.asisWidth;
  const wide = body.pelvisHalfWidth / size;
  const chest = body.acromionWidth / 2 / size;
  const hips: readonly Section[] = [
    [-105, 40, 40, 50, -6],
    [-85, 86, 64, 84, -6],
    [-50, wide + 4, 82, 108, -5],
    [-5, wide + 17, 88, 116, -6],
    [40, wide + 13, 92, 108, -9],
    [asis, half, front, front, ahead],
    [asis + 34, half - 9, front - 4, front - 8, ahead + 2],
  ];
  const top = body.trunk;
  const shirt: readonly Section[] = [
    [asis + 12, half - 6, front - 4, front - 6, ahead + 1],
    [asis + 28, half + 1, front + 2, front, ahead + 2],
    [0.34 * top, half - 12, front - 6, front - 12, ahead + 5],
    [0.48 * top, chest - 48, 92, 88, 0],
    [0.66 * top, chest - 36, fullChest ? 116 : 106, 94, 0],
    [0.8 * top, chest - 24, fullChest ? 102 : 99, 98, -4],
    [0.89 * top, chest - 18, 84, 94, -9],
    [0.965 * top, chest - 12, 68, 82, -13],
    [1.01 * top, chest - 21, 57, 70, -15],
    [1.038 * top, chest - 50, 50, 60, -14],
    [1.06 * top, chest - 84, 47, 55, -12],
    [1.08 * top, 56, 46, 53, -9],
  ];
  const neck: readonly Section[] = [
    [1.0 * top, 66, 50, 56, -14],
    [1.07 * top, 52, 47, 52, -8],
    [1.14 * top, 47, 46, 48, 4],
    [1.24 * top, 46, 46, 46, 10],
  ];
  const belt: readonly Section[] = [
    [asis - BELT_HALF, half, front, front, ahead],
    [asis + BELT_HALF, half, front, front, ahead],
  ];
  return {
    hips: shapeOf(hips, 18, size, 2),
    shirt: shapeOf(shirt, 34, size, 4),
    neck: shapeOf(neck, 10, size),
    belt: shapeOf(belt, 2, size, 5),
  };
};

/** The spine bends smoothly from the pelvis's axes to the trunk's. */
export const alongSpine = (bones: Skeleton, height: number): { centre: Vec; axes: Axes } => {
  const { pelvis, trunk, hipMiddle, body } = bones;
  const t = ease((height / body.trunk - 0.1) / 0.6);
  const up = unit(mix(pelvis.up, trunk.up, t));
  const lean = mix(pelvis.forward, trunk.forward, t);
  const forward = unit(sub(lean, scale(up, dot(lean, up))));
  const centre = mix(
    along(hipMiddle, pelvis, [0, 0, height]),
    along(hipMiddle, trunk, [0, 0, height]),
    t,
  );
  return { centre, axes: { forward, left: cross(up, forward), up } };
};

/** Rings of a shape along the spine, from the top down. */
export const spineRings = (bones: Skeleton, shape: Shape, squareness: number): readonly Ring[] =>
  shape.places
    .map((height, index) => {
      const { centre, axes } = alongSpine(bones, height);
      return ringOf(shape, index, centre, axes, squareness);
    })
    .reverse();

export const addTrunk = (surfaces: Surfaces, bones: Skeleton, shapes: TrunkShapes): void => {
  surfaces.tube(spineRings(bones, shapes.hips, 2.5), 48, PAINT.shorts, PART.trunk);
  surfaces.tube(spineRings(bones, shapes.shirt, 2.5), 48, PAINT.shirt, PART.trunk);
  surfaces.tube(spineRings(bones, shapes.neck, 2), 28, PAINT.neck, PART.head);
};

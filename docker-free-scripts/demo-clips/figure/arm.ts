import type { Skeleton } from '../model/skeleton.ts';
import {
  add,
  along,
  type Axes,
  cross,
  dot,
  mix,
  RAD,
  scale,
  sub,
  unit,
  type Vec,
} from '../model/vec.ts';
import type { Ring, Surfaces } from '../paint/surfaces.ts';
import { NORM_HEIGHT } from './leg.ts';
import { PAINT, PART } from './paints.ts';
import { eggRings, ringOf, type Section, type Shape, shapeOf } from './profile.ts';

/** Places: 0 shoulder, 1 elbow, 2 wrist, 3 finger tips. */
const SKIN: readonly Section[] = [
  [-0.1, 12, 14, 14, 0],
  [0, 40, 44, 45, 0],
  [0.3, 40, 44, 43, 0],
  [0.7, 35, 38, 38, 0],
  [1, 33, 35, 36, 0],
  [1.25, 35, 38, 36, 1],
  [1.6, 27, 29, 29, 0],
  [1.95, 18, 26, 24, 0],
  [2.1, 15, 32, 26, 0],
  [2.4, 16, 40, 34, 2],
  [2.65, 14, 37, 33, 2],
  [2.85, 12, 31, 29, 2],
  [2.96, 9, 22, 20, 2],
  [3.0, 4, 10, 9, 2],
];

const SLEEVE: readonly Section[] = [
  [-0.122, 6, 6, 6, 0],
  [-0.108, 22, 26, 28, 0],
  [-0.06, 38, 43, 46, 0],
  [0.02, 46, 51, 53, 0],
  [0.25, 46, 50, 50, 0],
  [0.58, 47, 51, 50, 0],
];

export interface ArmShapes {
  readonly skin: Shape;
  readonly sleeve: Shape;
  readonly upper: number;
  readonly fore: number;
  readonly hand: number;
}

export const armShapes = (height: number, girth: number): ArmShapes => {
  const size = (height / NORM_HEIGHT) * girth;
  return {
    skin: shapeOf(SKIN, 46, size * 0.96),
    sleeve: shapeOf(SLEEVE, 16, size),
    upper: 0.172 * height,
    fore: 0.148 * height,
    hand: 0.1 * height,
  };
};

/** A bone that hangs `out` from the body and is raised `ahead` of it, degrees, as limb axes. */
const hanging = (trunk: Axes, sign: number, out: number, ahead: number): Axes => {
  const way = (front: number, away: number, below: number): Vec =>
    add(add(scale(trunk.forward, front), scale(trunk.left, sign * away)), scale(trunk.up, -below));
  const [so, co] = [Math.sin(out * RAD), Math.cos(out * RAD)];
  const [sa, ca] = [Math.sin(ahead * RAD), Math.cos(ahead * RAD)];
  const up = scale(way(co * sa, so, co * ca), -1);
  const front = way(ca, 0, -sa);
  const forward = unit(sub(front, scale(up, dot(front, up))));
  return { forward, left: cross(up, forward), up };
};

/** How the arms are held: hanging free, or forearms before the waist so that the hip stays in sight. */
export type ArmHold = 'hanging' | 'before-waist';

/** Directions of upper arm, forearm and hand: [out from the body, raised ahead], degrees. */
const HOLDS: Readonly<Record<ArmHold, readonly (readonly [number, number])[]>> = {
  hanging: [
    [11, -3],
    [6, 13],
    [1, 16],
  ],
  'before-waist': [
    [9, -16],
    [-24, 96],
    [-40, 100],
  ],
};

const blend = (a: Axes, b: Axes, t: number): Axes => {
  const up = unit(mix(a.up, b.up, t));
  const lean = mix(a.forward, b.forward, t);
  const forward = unit(sub(lean, scale(up, dot(lean, up))));
  return { forward, left: cross(up, forward), up };
};

/** The arm hangs a little out from the body, more while balancing (0 to 1). */
export const addArm = (
  surfaces: Surfaces,
  bones: Skeleton,
  shapes: ArmShapes,
  sign: 1 | -1,
  balancing: number,
  hold: ArmHold,
  part: number,
): void => {
  const { trunk, body } = bones;
  const inward = 0.5 * body.acromionWidth - 0.016 * body.height;
  const shoulder = along(bones.acromionMiddle, trunk, [-8, sign * inward, -0.0115 * body.height]);
  const limb = (index: number): Axes => {
    const [out, ahead] = HOLDS[hold][index] ?? [0, 0];
    return hanging(trunk, sign, out + (hold === 'hanging' ? 4 * balancing : 0), ahead);
  };
  const [upper, fore, hand] = [limb(0), limb(1), limb(2)];
  const elbow = sub(shoulder, scale(upper.up, shapes.upper));
  const wrist = sub(elbow, scale(fore.up, shapes.fore));
  const at = (place: number): { centre: Vec; axes: Axes } => {
    const turnElbow = Math.min(1, Math.max(0, (place - 0.8) / 0.4));
    const turnWrist = Math.min(1, Math.max(0, (place - 1.85) / 0.3));
    const axes = place < 1.5 ? blend(upper, fore, turnElbow) : blend(fore, hand, turnWrist);
    if (place <= 1) return { centre: sub(shoulder, scale(upper.up, place * shapes.upper)), axes };
    if (place <= 2) return { centre: sub(elbow, scale(fore.up, (place - 1) * shapes.fore)), axes };
    return { centre: sub(wrist, scale(hand.up, (place - 2) * shapes.hand)), axes };
  };
  const rings = (shape: Shape): readonly Ring[] =>
    shape.places.map((place, index) => {
      const { centre, axes } = at(place);
      return ringOf(shape, index, centre, axes);
    });
  surfaces.tube(rings(shapes.skin), 24, PAINT.arm, part);
  surfaces.tube(rings(shapes.sleeve), 28, PAINT.shirt, part);
  addThumb(surfaces, hand, wrist, shapes.hand, part);
};

const addThumb = (surfaces: Surfaces, hand: Axes, wrist: Vec, size: number, part: number): void => {
  const centre = along(wrist, hand, [0.2 * size, 0, -0.36 * size]);
  const up = unit(add(hand.up, scale(hand.forward, -0.45)));
  const forward = unit(sub(hand.forward, scale(up, dot(hand.forward, up))));
  surfaces.tube(
    eggRings(centre, { forward, left: cross(up, forward), up }, [
      0.06 * size,
      0.07 * size,
      0.24 * size,
    ]),
    12,
    PAINT.skin,
    part,
  );
};

export const armPart = (supportSide: boolean): number =>
  supportSide ? PART.supportArm : PART.liftedArm;

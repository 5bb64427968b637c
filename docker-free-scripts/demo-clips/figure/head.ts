import type { Skeleton } from '../model/skeleton.ts';
import {
  along,
  type Axes,
  axesFromAngles,
  mix,
  unit,
  cross,
  dot,
  scale,
  sub,
} from '../model/vec.ts';
import type { Surfaces } from '../paint/surfaces.ts';
import type { Look } from './looks.ts';
import { PAINT, PART } from './paints.ts';
import { eggRings, ringOf, type Section, shapeOf } from './profile.ts';

/** Heights from the chin up, mm of a head of 222. */
export const HEAD_TALL = 222;
const SECTIONS: readonly Section[] = [
  [-2, 10, 10, 12, 54],
  [4, 25, 20, 30, 50],
  [16, 40, 36, 48, 38],
  [36, 53, 56, 66, 24],
  [62, 62, 74, 84, 13],
  [92, 69, 84, 94, 6],
  [122, 73, 90, 100, 2],
  [152, 74, 92, 100, -2],
  [180, 68, 82, 90, -5],
  [202, 52, 62, 68, -8],
  [216, 28, 34, 38, -9],
  [221, 8, 9, 10, -9],
];
/**
 * Hair stands off the skull: full on top and behind; below the brow it keeps to the back unless it
 * falls `forward` (0 to 1), and low on the neck it draws in.
 */
const hairSections = (look: Look): readonly Section[] =>
  SECTIONS.filter(([z]) => z > 10 && z >= look.hairDown - 30).map(([z, w, f, b, s]) => {
    const top = Math.min(1, Math.max(0, (z - 135) / 45));
    const drawnIn = look.hairForward > 0.4 ? 0 : 7 * Math.min(1, Math.max(0, (104 - z) / 40));
    const front = Math.max(look.hairForward, 0.2 + 0.8 * top);
    return [z, w + 3 + top - drawnIn, f * front + 3 * top, b + 9 - drawnIn, s];
  });

const skull = (bones: Skeleton): Axes => {
  const upright = axesFromAngles(0, 0, 0);
  const up = unit(mix(bones.trunk.up, upright.up, 0.7));
  const lean = mix(bones.trunk.forward, upright.forward, 0.6);
  const forward = unit(sub(lean, scale(up, dot(lean, up))));
  return { forward, left: cross(up, forward), up };
};

/** The head keeps level and looks into the lens while the trunk leans. */
export const addHead = (surfaces: Surfaces, bones: Skeleton, look: Look): void => {
  const axes = skull(bones);
  const size = (0.13 * bones.body.height * look.headScale) / HEAD_TALL;
  const chin = along(bones.acromionMiddle, bones.trunk, [0, 0, 0.043 * bones.body.height]);
  const at = (x: number, y: number, z: number) => along(chin, axes, [x * size, y * size, z * size]);
  const lathe = (
    sections: readonly Section[],
    count: number,
    more: number,
    paint: number,
  ): void => {
    const shape = shapeOf(sections, count, size, more * size);
    const rings = shape.places.map((z, index) => ringOf(shape, index, at(0, 0, z), axes, 2.2));
    surfaces.tube(rings.reverse(), 48, paint, PART.head);
  };
  lathe(SECTIONS, 36, 0, PAINT.head);
  lathe(hairSections(look), 30, look.hairThick, PAINT.hair);
  const egg = (
    place: readonly [number, number, number],
    r: readonly [number, number, number],
    paint: number,
  ): void => {
    surfaces.tube(
      eggRings(at(...place), axes, [r[0] * size, r[1] * size, r[2] * size]),
      16,
      paint,
      PART.head,
    );
  };
  egg([97, 0, 84], [9, 11, 15], PAINT.skin);
  egg([4, 72, 98], [7, 15, 26], PAINT.skin);
  egg([4, -72, 98], [7, 15, 26], PAINT.skin);
  if (look.knot === 'high') egg([-58, 0, 222], [34, 34, 30], PAINT.hair);
  if (look.knot === 'plaits')
    for (const side of [1, -1]) {
      egg([-26, 84 * side, 74], [17, 17, 15], PAINT.hair);
      egg([-24, 92 * side, 22], [20, 20, 56], PAINT.hair);
    }
};

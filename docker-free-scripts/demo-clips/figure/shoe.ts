import type { Body } from '../model/bodies.ts';
import type { Leg } from '../model/skeleton.ts';
import { along } from '../model/vec.ts';
import type { Ring, Surfaces } from '../paint/surfaces.ts';
import { PAINT } from './paints.ts';

/** [ahead of the ankle, half width, top, bottom], shares of the ankle's height and the foot. */
const UPPER: readonly (readonly [number, number, number, number])[] = [
  [-0.455, 0.05, -0.5, -0.8],
  [-0.44, 0.16, -0.15, -0.94],
  [-0.36, 0.28, 0.08, -0.98],
  [-0.2, 0.34, 0.16, -1],
  [0, 0.37, 0.14, -1],
  [0.16, 0.39, 0.02, -1],
  [0.32, 0.41, -0.2, -1],
  [0.5, 0.44, -0.42, -1],
  [0.7, 0.46, -0.55, -1],
  [0.86, 0.42, -0.62, -0.98],
  [0.96, 0.31, -0.68, -0.94],
  [1.02, 0.16, -0.74, -0.88],
  [1.035, 0.05, -0.78, -0.84],
];

/** Rings run from heel to toe, so a ring's own front is the top of the foot. */
const ringsOf = (leg: Leg, body: Body, sole: boolean): readonly Ring[] => {
  const breadth = body.ankleToToe * 0.57;
  const drawn = sole ? UPPER.slice(1, -1) : UPPER;
  return drawn.map(([ahead, half, top, bottom], index) => {
    const [high, low] = sole ? [-0.74, -1] : [top, bottom];
    const middle = ((high + low) / 2) * body.ankleHeight;
    const reach = ((high - low) / 2) * body.ankleHeight;
    const wider = sole ? 1.06 : 1;
    const longer = sole ? 1.035 : 1;
    return {
      centre: along(leg.ankle, leg.foot, [ahead * longer * body.ankleToToe, 0, middle]),
      left: leg.foot.left,
      forward: leg.foot.up,
      halfWidth: half * wider * breadth,
      front: reach,
      back: reach,
      squareness: sole ? 5 : 2.6,
      v: index / (drawn.length - 1),
    };
  });
};

export const addShoe = (surfaces: Surfaces, leg: Leg, body: Body, part: number): void => {
  surfaces.tube(ringsOf(leg, body, false), 28, PAINT.shoe, part);
  surfaces.tube(ringsOf(leg, body, true), 24, PAINT.sole, part);
};

import { type Body, STRAP_ABOVE_KNEE, STRAP_SKIN } from '../model/bodies.ts';
import { strapHalf } from '../model/landmarks.ts';
import type { Leg } from '../model/skeleton.ts';
import { add, type Axes, cross, dot, mix, scale, sub, unit, type Vec } from '../model/vec.ts';
import type { Ring, Surfaces } from '../paint/surfaces.ts';
import { PAINT } from './paints.ts';
import { ringOf, type Section, type Shape, shapeOf } from './profile.ts';

/** Norm for the drawn girths: the woman of 1680 mm. */
export const NORM_HEIGHT = 1680;
/** The centre line rounds the knee from here above to here below it, mm. */
const KNEE_CURVE = 62;

export interface LegShapes {
  readonly skin: Shape;
  readonly shorts: Shape;
}

/** Places: 0 at the hip, 1 at the knee, 2 at the ankle. */
const sections = (body: Body, size: number): readonly Section[] => {
  const knee = body.kneeWidth / 2 / size;
  const strap = strapHalf(body.kneeWidth) / size;
  const strapPlace = 1 - STRAP_ABOVE_KNEE / body.thigh;
  return [
    [0, 80, 76, 86, 0],
    [0.2, 79, 77, 82, 2],
    [0.42, 72, 74, 74, 3],
    [0.65, 62, 64, 64, 2],
    [strapPlace, strap, STRAP_SKIN / size, 56, 0],
    [1, knee, knee, 49, 0],
    [1.1, knee * 0.95, 44, 50, -1],
    [1.32, 51, 38, 64, -4],
    [1.42, 49, 36, 62, -4],
    [1.6, 41, 33, 47, -2],
    [1.8, 31, 28, 34, 0],
    [1.93, 29, 28, 32, 0],
    [2.03, 31, 33, 35, 0],
  ];
};

export const legShapes = (body: Body): LegShapes => {
  const size = (body.height / NORM_HEIGHT) * body.girth;
  const all = sections(body, size);
  const cloth = all.filter(([place]) => place < 0.6);
  const hem: Section = [0.56, 71, 72, 71, 3];
  return {
    skin: shapeOf(all, 64, size),
    shorts: shapeOf([[-0.12, 68, 64, 74, 0], ...cloth, hem], 20, size, 6 * size),
  };
};

/** Centre and axes of the leg at a place: straight along both bones, rounded through the knee. */
export const alongLeg = (
  leg: Leg,
  body: Body,
  place: number,
): { centre: Vec; axes: Axes; bend: number } => {
  const above = (1 - place) * body.thigh;
  const below = (place - 1) * body.shank;
  if (above >= KNEE_CURVE)
    return { centre: add(leg.knee, scale(leg.thigh.up, above)), axes: leg.thigh, bend: 0 };
  if (below >= KNEE_CURVE)
    return { centre: sub(leg.knee, scale(leg.shank.up, below)), axes: leg.shank, bend: 0 };
  const t = 0.5 + (place < 1 ? -above : below) / (2 * KNEE_CURVE);
  const from = add(leg.knee, scale(leg.thigh.up, KNEE_CURVE));
  const to = sub(leg.knee, scale(leg.shank.up, KNEE_CURVE));
  const centre = mix(mix(from, leg.knee, t), mix(leg.knee, to, t), t);
  const up = unit(mix(leg.thigh.up, leg.shank.up, t));
  const lean = mix(leg.thigh.forward, leg.shank.forward, t);
  const forward = unit(sub(lean, scale(up, dot(lean, up))));
  const flexed = Math.acos(Math.min(1, Math.max(-1, dot(leg.thigh.up, leg.shank.up))));
  return {
    centre,
    axes: { forward, left: cross(up, forward), up },
    bend: Math.sin(flexed / 2) * 4 * t * (1 - t),
  };
};

/** The joint's front grows where the rounded line leaves it, so a bent knee keeps its cap. */
const KNEE_CAP = 20;

export const legRings = (leg: Leg, body: Body, shape: Shape): readonly Ring[] =>
  shape.places.map((place, index) => {
    const { centre, axes, bend } = alongLeg(leg, body, place);
    const ring = ringOf(shape, index, centre, axes);
    return { ...ring, front: ring.front + bend * KNEE_CAP, back: ring.back * (1 - 0.2 * bend) };
  });

export const addLeg = (
  surfaces: Surfaces,
  leg: Leg,
  body: Body,
  shapes: LegShapes,
  part: number,
): void => {
  surfaces.tube(legRings(leg, body, shapes.skin), 32, PAINT.leg, part);
  surfaces.tube(legRings(leg, body, shapes.shorts), 36, PAINT.shorts, part);
};

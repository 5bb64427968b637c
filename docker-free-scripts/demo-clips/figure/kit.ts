import type { Leg, Skeleton } from '../model/skeleton.ts';
import { beltTip, type Pointers, strapHalf, strapMiddle, thighTip } from '../model/landmarks.ts';
import { STRAP_SKIN } from '../model/bodies.ts';
import { along, type Axes, cross, scale, sub, unit, type Vec } from '../model/vec.ts';
import type { Surfaces } from '../paint/surfaces.ts';
import { PAINT, PART } from './paints.ts';
import { eggRings } from './profile.ts';
import { spineRings, type TrunkShapes } from './trunk.ts';

const STICK_HALF = 4.5;
export const BALL_RADIUS = 10;
const STRAP_HALF_HEIGHT = 15;

/** A taped dowel from `from` to its ball at `tip`. */
const addStick = (surfaces: Surfaces, from: Vec, tip: Vec, axes: Axes): void => {
  const way = unit(sub(tip, from));
  const left = axes.left;
  // rings run along left × forward = the stick's way
  const forward = cross(way, left);
  const ring = (centre: Vec, v: number) => ({
    centre,
    left,
    forward,
    halfWidth: STICK_HALF,
    front: STICK_HALF,
    back: STICK_HALF,
    squareness: 2,
    v,
  });
  const inner = sub(tip, scale(way, BALL_RADIUS * 0.7));
  surfaces.tube([ring(from, 0), ring(inner, 1)], 10, PAINT.stick, PART.kit);
  surfaces.tube(
    eggRings(tip, axes, [BALL_RADIUS, BALL_RADIUS, BALL_RADIUS]),
    16,
    PAINT.ball,
    PART.kit,
  );
};

const addStrap = (
  surfaces: Surfaces,
  leg: Leg,
  kneeWidth: number,
  pointer: number | null,
): void => {
  const middle = strapMiddle(leg);
  const half = strapHalf(kneeWidth);
  const ring = (up: number, thick: number, v: number) => ({
    centre: along(middle, leg.thigh, [0, 0, up]),
    left: leg.thigh.left,
    forward: leg.thigh.forward,
    halfWidth: half + thick,
    front: STRAP_SKIN + thick,
    back: 57 + thick,
    squareness: 2,
    v,
  });
  const top = STRAP_HALF_HEIGHT;
  surfaces.tube(
    [ring(top, 0, 0), ring(top, 3, 0.05), ring(-top, 3, 0.95), ring(-top, 0, 1)],
    36,
    PAINT.strap,
    PART.kit,
  );
  if (pointer === null) return;
  const base = along(middle, leg.thigh, [STRAP_SKIN - 2, 0, 0]);
  surfaces.tube(eggRings(base, leg.thigh, [15, 8, 13]), 14, PAINT.belt, PART.kit);
  addStick(surfaces, base, thighTip(leg, pointer), leg.thigh);
};

/** Belt and straps go all around; both thighs carry a strap where both sides are filmed in a take. */
export const addKit = (
  surfaces: Surfaces,
  bones: Skeleton,
  shapes: TrunkShapes,
  worn: Pointers,
  bothThighs: boolean,
): void => {
  const { body, pelvis } = bones;
  if (worn.belt !== null) {
    surfaces.tube(spineRings(bones, shapes.belt, 2.5), 48, PAINT.belt, PART.kit);
    const base = along(bones.asisMiddle, pelvis, [24, 0, 0]);
    surfaces.tube(eggRings(base, pelvis, [20, 12, 15]), 14, PAINT.belt, PART.kit);
    addStick(surfaces, base, beltTip(bones, worn.belt), pelvis);
  }
  if (worn.thigh !== null) {
    addStrap(surfaces, bones.support, body.kneeWidth, worn.thigh);
    if (bothThighs) addStrap(surfaces, bones.lifted, body.kneeWidth, worn.thigh);
  }
};

import type { Colour } from '../figure/paints.ts';
import type { Vec } from '../model/vec.ts';
import { boardColour } from './boards.ts';
import {
  type Block,
  CEILING,
  CEILING_Z,
  type Pole,
  type RoomScene,
  WALL,
  WALL_X,
} from './room-scene.ts';

export interface Hit {
  readonly distance: number;
  readonly normal: Vec;
  readonly tint: Colour;
}

const CLOSE = 0.5;
const MISS = Infinity;

/** Distance at which a ray enters a block; Infinity where it misses or starts inside. */
const toBlock = (b: Block, from: Vec, way: Vec): number => {
  const rx = from[0] - b.centre[0];
  const ry = from[1] - b.centre[1];
  const ox = b.cos * rx + b.sin * ry;
  const oy = b.cos * ry - b.sin * rx;
  const oz = from[2] - b.centre[2];
  const ix = 1 / (b.cos * way[0] + b.sin * way[1] || 1e-12);
  const iy = 1 / (b.cos * way[1] - b.sin * way[0] || 1e-12);
  const iz = 1 / (way[2] || 1e-12);
  const hx = Math.abs(b.half[0] * ix);
  const hy = Math.abs(b.half[1] * iy);
  const hz = Math.abs(b.half[2] * iz);
  const enter = Math.max(-ox * ix - hx, -oy * iy - hy, -oz * iz - hz);
  const leave = Math.min(-ox * ix + hx, -oy * iy + hy, -oz * iz + hz);
  return enter > leave || enter < CLOSE ? MISS : enter;
};

/** Whether a ray comes near a group at all. */
const meetsBound = (b: Block, from: Vec, way: Vec): boolean => {
  const ix = 1 / (way[0] || 1e-12);
  const iy = 1 / (way[1] || 1e-12);
  const iz = 1 / (way[2] || 1e-12);
  const ox = (from[0] - b.centre[0]) * ix;
  const oy = (from[1] - b.centre[1]) * iy;
  const oz = (from[2] - b.centre[2]) * iz;
  const hx = Math.abs(b.half[0] * ix);
  const hy = Math.abs(b.half[1] * iy);
  const hz = Math.abs(b.half[2] * iz);
  const leave = Math.min(hx - ox, hy - oy, hz - oz);
  return leave > 0 && Math.max(-ox - hx, -oy - hy, -oz - hz) < leave;
};

const toPole = (p: Pole, from: Vec, way: Vec): number => {
  const ox = from[0] - p.x;
  const oy = from[1] - p.y;
  const a = way[0] * way[0] + way[1] * way[1];
  const half = ox * way[0] + oy * way[1];
  const inner = half * half - a * (ox * ox + oy * oy - p.radius * p.radius);
  if (inner < 0 || a < 1e-9) return MISS;
  const distance = (-half - Math.sqrt(inner)) / a;
  const z = from[2] + distance * way[2];
  return distance < CLOSE || z < p.bottom || z > p.top ? MISS : distance;
};

const toFloor = (from: Vec, way: Vec): number => (way[2] < 0 ? from[2] / -way[2] : MISS);
const toCeiling = (from: Vec, way: Vec): number =>
  way[2] > 0 ? (CEILING_Z - from[2]) / way[2] : MISS;
const toWall = (from: Vec, way: Vec): number => (way[0] < 0 ? (WALL_X - from[0]) / way[0] : MISS);

/** The nearest piece of furniture along a ray. */
const toFurniture = (
  scene: RoomScene,
  from: Vec,
  way: Vec,
): { distance: number; block: Block | null; pole: Pole | null } => {
  let distance = MISS;
  let block: Block | null = null;
  let pole: Pole | null = null;
  for (const group of scene.groups) {
    if (!meetsBound(group.bound, from, way)) continue;
    for (const b of group.blocks) {
      const found = toBlock(b, from, way);
      if (found < distance) [distance, block] = [found, b];
    }
  }
  for (const p of scene.poles) {
    const found = toPole(p, from, way);
    if (found < distance) [distance, block, pole] = [found, null, p];
  }
  return { distance, block, pole };
};

const beyond = (distance: number): number => (distance > CLOSE ? distance : MISS);

/** Distance to the first thing of the room a ray meets. */
export const reachOf = (scene: RoomScene, from: Vec, way: Vec): number =>
  Math.min(
    beyond(toFloor(from, way)),
    beyond(toCeiling(from, way)),
    beyond(toWall(from, way)),
    toFurniture(scene, from, way).distance,
  );

/** Whether a piece of furniture stands between a point and one `reach` mm along a ray. */
export const blockedBy = (scene: RoomScene, from: Vec, way: Vec, reach: number): boolean =>
  toFurniture(scene, from, way).distance < reach;

const blockNormal = (b: Block, at: Vec): Vec => {
  const [rx, ry] = [at[0] - b.centre[0], at[1] - b.centre[1]];
  const x = (b.cos * rx + b.sin * ry) / b.half[0];
  const y = (b.cos * ry - b.sin * rx) / b.half[1];
  const z = (at[2] - b.centre[2]) / b.half[2];
  if (Math.abs(z) > Math.abs(x) && Math.abs(z) > Math.abs(y)) return [0, 0, Math.sign(z)];
  const sign = Math.abs(x) > Math.abs(y) ? Math.sign(x) : Math.sign(y);
  return Math.abs(x) > Math.abs(y)
    ? [sign * b.cos, sign * b.sin, 0]
    : [-sign * b.sin, sign * b.cos, 0];
};

/** First thing of the room a ray meets, or null where it leaves the room. */
export const hitRoom = (scene: RoomScene, from: Vec, way: Vec): Hit | null => {
  const floor = beyond(toFloor(from, way));
  const ceiling = beyond(toCeiling(from, way));
  const wall = beyond(toWall(from, way));
  const furniture = toFurniture(scene, from, way);
  const distance = Math.min(floor, ceiling, wall, furniture.distance);
  if (distance === MISS) return null;
  const at: Vec = [
    from[0] + distance * way[0],
    from[1] + distance * way[1],
    from[2] + distance * way[2],
  ];
  const { block, pole } = furniture;
  if (distance === furniture.distance && block !== null)
    return { distance, normal: blockNormal(block, at), tint: block.tint };
  if (distance === furniture.distance && pole !== null) {
    const band = Math.floor(at[2] / pole.band) % 2 === 0 ? 0 : 1;
    const normal: Vec = [(at[0] - pole.x) / pole.radius, (at[1] - pole.y) / pole.radius, 0];
    return { distance, normal, tint: pole.tints[band] };
  }
  if (distance === wall) return { distance, normal: [1, 0, 0], tint: WALL };
  return distance === floor
    ? { distance, normal: [0, 0, 1], tint: boardColour(at[0], at[1]) }
    : { distance, normal: [0, 0, -1], tint: CEILING };
};

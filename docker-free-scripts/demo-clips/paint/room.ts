import { type Camera, PICTURE } from '../model/camera.ts';
import { seededRandom } from '../model/random.ts';
import { add, cross, dot, length, scale, sub, unit, type Vec } from '../model/vec.ts';
import { GROUND, LAMP, LAMP_COLOUR, SKY } from './light.ts';
import { blockedBy, hitRoom, reachOf } from './room-hit.ts';
import type { RoomScene } from './room-scene.ts';

/** Channels kept of every pixel of the empty room. */
export const ROOM_CHANNELS = 12;
/** The first of them are means over the pixel. */
const LIGHT_CHANNELS = 6;
/** lamp light r g b, room light r g b, point x y z, normal x y z */
export type RoomPicture = Float32Array;

export const emptyRoomPicture = (): RoomPicture =>
  new Float32Array(new SharedArrayBuffer(PICTURE.width * PICTURE.height * ROOM_CHANNELS * 4));

const LAMP_HALF = 620;
const LAMP_FACING: Vec = unit(scale(LAMP, -1));
const LAMP_ACROSS: Vec = unit(cross([0, 0, 1], LAMP_FACING));
const LAMP_UP: Vec = cross(LAMP_FACING, LAMP_ACROSS);
/** Distance at which the lamp's colour is meant, mm. */
const LAMP_NORM = length(LAMP) - 700;
/** Corners darken over this distance, mm. */
const CORNER_REACH = 420;

const aroundNormal = (normal: Vec, a: number, b: number): Vec => {
  const helper: Vec = Math.abs(normal[2]) > 0.9 ? [1, 0, 0] : [0, 0, 1];
  const across = unit(cross(normal, helper));
  const upward = cross(normal, across);
  const radius = Math.sqrt(a);
  const turn = 2 * Math.PI * b;
  return add(
    add(scale(across, radius * Math.cos(turn)), scale(upward, radius * Math.sin(turn))),
    scale(normal, Math.sqrt(1 - a)),
  );
};

/** Lamp light (with soft shadow of the furniture) and openness to the room at a point. */
const lightAt = (
  scene: RoomScene,
  at: Vec,
  normal: Vec,
  random: () => number,
  looks: number,
): { lamp: number; open: number } => {
  let [lamp, open] = [0, 0];
  for (let look = 0; look < looks; look += 1) {
    const spot = add(
      add(LAMP, scale(LAMP_ACROSS, LAMP_HALF * (2 * random() - 1))),
      scale(LAMP_UP, LAMP_HALF * (2 * random() - 1)),
    );
    const ray = sub(spot, at);
    const far = length(ray);
    const way = scale(ray, 1 / far);
    const facing = dot(way, normal);
    if (facing > 0 && !blockedBy(scene, at, way, far))
      lamp += facing * Math.max(0.25, -dot(way, LAMP_FACING)) * (LAMP_NORM / far) ** 2;
    const out = aroundNormal(normal, random(), random());
    open += Math.min(1, 0.25 + 0.75 * (reachOf(scene, at, out) / CORNER_REACH));
  }
  return { lamp: lamp / looks, open: open / looks };
};

/** Paints the rows from `top` to `bottom` of the empty room, `side`² rays a pixel. */
export const paintRoom = (
  picture: RoomPicture,
  camera: Camera,
  scene: RoomScene,
  top: number,
  bottom: number,
  side = 3,
): void => {
  const { width, height } = PICTURE;
  const { focalPx } = camera.plan;
  const middle = Math.floor((side * side) / 2);
  for (let row = top; row < bottom; row += 1)
    for (let column = 0; column < width; column += 1) {
      const random = seededRandom(row * width + column);
      const at = (row * width + column) * ROOM_CHANNELS;
      for (let ray = 0; ray < side * side; ray += 1) {
        const u = column + ((ray % side) + 0.5) / side - width / 2;
        const v = row + (Math.floor(ray / side) + 0.5) / side - height / 2;
        const way = unit(
          add(scale(camera.ahead, focalPx), sub(scale(camera.right, u), scale(camera.up, v))),
        );
        const hit = hitRoom(scene, camera.eye, way);
        if (hit === null) continue;
        const point = add(camera.eye, scale(way, hit.distance - 0.5));
        const { lamp, open } = lightAt(scene, point, hit.normal, random, 2);
        // the ceiling lives off the light that floor and walls throw back
        const sky = hit.normal[2] < -0.5 ? 1.15 : 0.5 + 0.5 * hit.normal[2];
        for (let c = 0 as 0 | 1 | 2; c < 3; c = (c + 1) as 0 | 1 | 2) {
          const room = GROUND[c] + (SKY[c] - GROUND[c]) * sky;
          picture[at + c] = (picture[at + c] ?? 0) + hit.tint[c] * LAMP_COLOUR[c] * lamp;
          picture[at + 3 + c] = (picture[at + 3 + c] ?? 0) + hit.tint[c] * room * open;
          // one point, not a mean: between two surfaces there is nothing for a shadow to fall on
          if (ray === middle)
            [picture[at + 6 + c], picture[at + 9 + c]] = [point[c], hit.normal[c]];
        }
      }
      for (let c = 0; c < LIGHT_CHANNELS; c += 1)
        picture[at + c] = (picture[at + c] ?? 0) / (side * side);
    }
};

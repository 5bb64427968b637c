import { PICTURE } from '../model/camera.ts';
import { type Blocker, opennessAt } from './crowding.ts';
import type { Box } from './fill.ts';
import { mayShade, type ShadowMap, TO_LAMP } from './light.ts';
import { ROOM_CHANNELS, type RoomPicture } from './room.ts';

/** Every second pixel is worked out, the rest lies between: shadows are soft. */
const STEP = 2;
/** The person takes no light of the room from what is farther than this, mm. */
const CROWDED = 760;

/** Far from the feet the lamp's breadth softens the shadow, mm. */
const spreadAt = (x: number, y: number, z: number): number =>
  8 + 0.14 * Math.sqrt(x * x + y * y + z * z) * (0.4 + 0.6 * Math.abs(TO_LAMP[2]));

/** The person's soft shadow on floor and wall, and the darkness under the feet. */
export class RoomShade {
  /** Two numbers a pixel: share of the lamp's light, share of the room's light. */
  readonly shades = new Float32Array(PICTURE.width * PICTURE.height * 2).fill(1);
  /** Nothing outside changes from picture to picture. */
  readonly area: Box;
  private readonly pixels: Int32Array;

  constructor(private readonly room: RoomPicture) {
    const pixels: number[] = [];
    let [left, top, right, bottom] = [Number(PICTURE.width), Number(PICTURE.height), 0, 0];
    for (let v = 0; v < PICTURE.height; v += STEP)
      for (let u = 0; u < PICTURE.width; u += STEP) {
        const at = v * PICTURE.width + u;
        if (!this.reachable(at)) continue;
        pixels.push(at);
        left = Math.min(left, u);
        right = Math.max(right, u);
        top = Math.min(top, v);
        bottom = Math.max(bottom, v);
      }
    this.pixels = Int32Array.from(pixels);
    const edge = 2 * STEP;
    this.area = {
      left: Math.max(0, left - edge),
      top: Math.max(0, top - edge),
      right: Math.min(PICTURE.width, right + edge),
      bottom: Math.min(PICTURE.height, bottom + edge),
    };
  }

  /** Works out `shades` for the person as the lamp sees it. */
  update(shadow: ShadowMap, blockers: readonly Blocker[]): void {
    for (const at of this.pixels) this.work(at, shadow, blockers);
    const { left, top, right, bottom } = this.area;
    const { width } = PICTURE;
    for (let v = top; v < bottom; v += STEP)
      for (let u = left + 1; u < right - 1; u += STEP) this.between(v * width + u, 1);
    for (let v = top + 1; v < bottom - 1; v += STEP)
      for (let u = left; u < right; u += 1) this.between(v * width + u, width);
  }

  private reachable(at: number): boolean {
    const { room } = this;
    const i = at * ROOM_CHANNELS;
    const x = room[i + 6] as number;
    const y = room[i + 7] as number;
    const z = room[i + 8] as number;
    if (x * x + y * y < CROWDED * CROWDED) return true;
    return mayShade(x, y, z, spreadAt(x, y, z));
  }

  private between(at: number, reach: number): void {
    const { shades } = this;
    const before = 2 * (at - reach);
    const after = 2 * (at + reach);
    shades[2 * at] = ((shades[before] as number) + (shades[after] as number)) / 2;
    shades[2 * at + 1] = ((shades[before + 1] as number) + (shades[after + 1] as number)) / 2;
  }

  private work(at: number, shadow: ShadowMap, blockers: readonly Blocker[]): void {
    const { shades, room } = this;
    const i = at * ROOM_CHANNELS;
    const x = room[i + 6] as number;
    const y = room[i + 7] as number;
    const z = room[i + 8] as number;
    const turn = Math.imul(at, 0x9e3779b1) >>> 13;
    const lamp = 0.1 + 0.9 * shadow.lit(x, y, z, spreadAt(x, y, z), false, turn);
    const open =
      x * x + y * y > CROWDED * CROWDED
        ? 1
        : opennessAt(
            x,
            y,
            z,
            room[i + 9] as number,
            room[i + 10] as number,
            room[i + 11] as number,
            blockers,
            -1,
          );
    // drawn darker than it is: the eye looks for it to see a foot stand
    shades[2 * at] = lamp * (0.45 + 0.55 * open);
    shades[2 * at + 1] = open * open;
  }
}

import { PICTURE } from '../model/camera.ts';
import { type Blocker, opennessAt } from './crowding.ts';
import { type ShadowMap, TO_LAMP } from './light.ts';
import { ROOM_CHANNELS, type RoomPicture } from './room.ts';

/** Every second pixel is worked out, the rest lies between: shadows are soft. */
const STEP = 2;
/** No shadow falls on what is farther than this from the person, mm. */
const AREA = 2100;
/** Nor does it take the room's light from what is farther than this, mm. */
const CROWDED = 760;

/** The person's soft shadow on floor and wall, and the darkness under the feet. */
export class RoomShade {
  private readonly shades = new Float32Array(PICTURE.width * PICTURE.height * 2).fill(1);

  constructor(private readonly room: RoomPicture) {}

  /** Two numbers a pixel: share of the lamp's light, share of the room's light. */
  shade(shadow: ShadowMap, blockers: readonly Blocker[]): Float32Array {
    const { shades } = this;
    const { width, height } = PICTURE;
    for (let v = 0; v < height; v += STEP) {
      for (let u = 0; u < width; u += STEP) this.work(v * width + u, shadow, blockers);
      for (let u = 1; u < width - 1; u += STEP) this.between(v * width + u, 1);
    }
    for (let v = 1; v < height - 1; v += STEP)
      for (let u = 0; u < width; u += 1) this.between(v * width + u, width);
    return shades;
  }

  private between(at: number, reach: number): void {
    const { shades } = this;
    for (let c = 0; c < 2; c += 1)
      shades[2 * at + c] =
        ((shades[2 * (at - reach) + c] as number) + (shades[2 * (at + reach) + c] as number)) / 2;
  }

  private work(at: number, shadow: ShadowMap, blockers: readonly Blocker[]): void {
    const { shades, room } = this;
    const i = at * ROOM_CHANNELS;
    const x = room[i + 6] as number;
    const y = room[i + 7] as number;
    const z = room[i + 8] as number;
    if (Math.abs(x) > AREA || Math.abs(y) > AREA || z > 2000) return;
    // far from the feet the lamp's breadth softens the shadow
    const away = Math.sqrt(x * x + y * y + z * z) * (0.4 + 0.6 * Math.abs(TO_LAMP[2]));
    const spread = 8 + 0.14 * away;
    const lamp = 0.1 + 0.9 * shadow.lit(x, y, z, spread, false, Math.imul(at, 0x9e3779b1) >>> 13);
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

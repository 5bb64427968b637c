import { drawPerson, type Person, type Worn } from '../figure/person.ts';
import { type Camera, intoRoom, PICTURE } from '../model/camera.ts';
import type { Skeleton } from '../model/skeleton.ts';
import { RAD } from '../model/vec.ts';
import { blockersOf, shadeCrowding } from './crowding.ts';
import { type Dot, dotsOf } from './dots.ts';
import { type Box, DepthPicture } from './fill.ts';
import { developed, GRAIN_MASK, grainStart, lensShade, makeGrain } from './grade.ts';
import { ShadowMap } from './light.ts';
import type { RoomPicture } from './room.ts';
import { RoomShade } from './room-shade.ts';
import { shadePerson } from './shade.ts';
import { Surfaces } from './surfaces.ts';

/** Exposures added up for one picture: they smooth edges and blur what moves. */
const EXPOSURES = 5;
const OFFSETS: readonly (readonly [number, number])[] = [
  [0.1, 0.3],
  [-0.3, 0.1],
  [0, 0],
  [0.3, -0.1],
  [-0.1, -0.3],
].map(([x, y]) => [(x ?? 0) * 1.3, (y ?? 0) * 1.3] as const);
const MARGIN = 6;
/** The middle of the exposure last. */
const ORDER = [0, 1, 3, 4, 2] as const;
/** Developed pictures of the empty room, each with its own noise. */
const EMPTY_ROOMS = 6;
const NOTHING: Box = { left: PICTURE.width, top: PICTURE.height, right: 0, bottom: 0 };

const around = (a: Box, b: Box): Box => ({
  left: Math.min(a.left, b.left),
  top: Math.min(a.top, b.top),
  right: Math.max(a.right, b.right),
  bottom: Math.max(a.bottom, b.bottom),
});

export interface Posture {
  readonly bones: Skeleton;
  /** 0 on both feet, 1 on one: the arms come out a little */
  readonly balancing: number;
}

export interface PainterPlan {
  readonly camera: Camera;
  readonly person: Person;
  readonly worn: Worn;
  readonly room: RoomPicture;
  readonly stickers: boolean;
  readonly seed: number;
  /** the sensor's noise, display values; 0 for a still */
  readonly grain: number;
}

/** Paints pictures of one person in one room: rgb24, rows from the top. */
export class Painter {
  private readonly surfaces = new Surfaces();
  private readonly depth = new DepthPicture(PICTURE.width, PICTURE.height);
  private readonly shadow = new ShadowMap();
  private readonly light = new Float32Array(PICTURE.width * PICTURE.height * 4);
  private readonly vignette = Float32Array.from(
    { length: PICTURE.width * PICTURE.height },
    (_, at) => lensShade(at % PICTURE.width, Math.floor(at / PICTURE.width)),
  );
  private readonly roomShade: RoomShade;
  private readonly grainOf: Float32Array;
  private readonly emptyRooms: readonly Uint8ClampedArray[];
  /** where light of the person lies in `light` */
  private painted: Box = NOTHING;

  constructor(private readonly plan: PainterPlan) {
    this.roomShade = new RoomShade(plan.room);
    this.grainOf = makeGrain(plan.seed);
    const room = this.emptyRoom();
    this.emptyRooms = Array.from({ length: EMPTY_ROOMS }, (_, i) => this.grained(room, i));
  }

  /**
   * One picture. `postureAt(share)` gives the posture at a share of the exposure from −½ to ½; the
   * middle one is drawn last, so that `hides` afterwards tells what covers what.
   */
  paint(frame: number, postureAt: (share: number) => Posture): Uint8Array {
    const { plan, light } = this;
    const middle = postureAt(0);
    this.place(middle);
    this.shadow.draw(this.surfaces);
    this.roomShade.update(this.shadow, blockersOf(middle.bones, this.intoRoom));
    this.clearLight();
    for (const exposure of ORDER) {
      const posture = postureAt((exposure - (EXPOSURES - 1) / 2) / EXPOSURES);
      this.place(posture);
      shadeCrowding(this.surfaces, blockersOf(posture.bones, this.intoRoom));
      const box = this.project(OFFSETS[exposure] ?? [0, 0]);
      this.painted = around(this.painted, box);
      this.depth.clear(box);
      this.depth.fill(this.surfaces);
      shadePerson({
        surfaces: this.surfaces,
        depth: this.depth,
        box,
        camera: plan.camera,
        shadow: this.shadow,
        look: plan.person.look,
        dots: this.dots(posture.bones),
        turn: 3 * exposure,
        light,
      });
    }
    return this.develop(frame);
  }

  /** Whether something stands nearer to the lens than a point, after `paint`. */
  hides(point: readonly [number, number, number], slack: number): boolean {
    const { camera } = this.plan;
    const [u, v] = camera.project(point);
    if (u < 0 || v < 0 || u >= PICTURE.width || v >= PICTURE.height) return true;
    const at = Math.floor(v) * PICTURE.width + Math.floor(u);
    if ((this.depth.owner[at] ?? -1) < 0) return false;
    const far =
      (point[0] - camera.eye[0]) * camera.ahead[0] +
      (point[1] - camera.eye[1]) * camera.ahead[1] +
      (point[2] - camera.eye[2]) * camera.ahead[2];
    return 1 / (this.depth.near[at] ?? 1) < far - slack;
  }

  private readonly intoRoom = (point: readonly [number, number, number]) =>
    intoRoom(this.plan.camera.plan.facing)(point);

  private dots(bones: Skeleton): readonly Dot[] {
    if (!this.plan.stickers) return [];
    return dotsOf(bones, this.plan.camera, this.plan.worn.pointers, this.intoRoom);
  }

  private place(posture: Posture): void {
    const { surfaces, plan } = this;
    drawPerson(surfaces, plan.person, posture.bones, plan.worn, posture.balancing);
    this.turn(surfaces.points, surfaces.pointCount);
    this.turn(surfaces.normals, surfaces.pointCount);
  }

  /** Turns the first `count` points of an array from the person's coordinates into the room's. */
  private turn(array: Float32Array, count: number): void {
    const angle = this.plan.camera.plan.facing * RAD;
    if (angle === 0) return;
    const [c, s] = [Math.cos(angle), Math.sin(angle)];
    for (let p = 0; p < count; p += 1) {
      const x = array[3 * p] as number;
      const y = array[3 * p + 1] as number;
      array[3 * p] = c * x - s * y;
      array[3 * p + 1] = s * x + c * y;
    }
  }

  private project([du, dv]: readonly [number, number]): Box {
    const { surfaces, depth } = this;
    const { eye, right, up, ahead, plan } = this.plan.camera;
    const { points } = surfaces;
    let [left, top, rightmost, bottom] = [Infinity, Infinity, -Infinity, -Infinity];
    for (let p = 0; p < surfaces.pointCount; p += 1) {
      const x = (points[3 * p] ?? 0) - eye[0];
      const y = (points[3 * p + 1] ?? 0) - eye[1];
      const z = (points[3 * p + 2] ?? 0) - eye[2];
      const w = 1 / (x * ahead[0] + y * ahead[1] + z * ahead[2]);
      const reach = plan.focalPx * w;
      const u = PICTURE.width / 2 + reach * (x * right[0] + y * right[1] + z * right[2]) + du;
      const v = PICTURE.height / 2 - reach * (x * up[0] + y * up[1] + z * up[2]) + dv;
      depth.x[p] = u;
      depth.y[p] = v;
      depth.w[p] = w;
      left = Math.min(left, u);
      rightmost = Math.max(rightmost, u);
      top = Math.min(top, v);
      bottom = Math.max(bottom, v);
    }
    return {
      left: Math.max(0, Math.floor(left) - MARGIN),
      top: Math.max(0, Math.floor(top) - MARGIN),
      right: Math.min(PICTURE.width, Math.ceil(rightmost) + MARGIN),
      bottom: Math.min(PICTURE.height, Math.ceil(bottom) + MARGIN),
    };
  }

  private clearLight(): void {
    const { left, top, right, bottom } = this.painted;
    for (let row = top; row < bottom; row += 1)
      this.light.fill(0, 4 * (row * PICTURE.width + left), 4 * (row * PICTURE.width + right));
    this.painted = NOTHING;
  }

  /** The empty room through the sensor: the same noise on all three channels. */
  private grained(room: Float32Array, which: number): Uint8ClampedArray {
    const { grainOf, plan } = this;
    const start = grainStart(plan.seed, -1 - which);
    return Uint8ClampedArray.from(
      room,
      (value, i) =>
        value + plan.grain * (grainOf[(start + Math.floor(i / 3)) & GRAIN_MASK] as number),
    );
  }

  private emptyRoom(): Float32Array {
    const { room } = this.plan;
    const out = new Float32Array(PICTURE.width * PICTURE.height * 3);
    for (let at = 0; at < PICTURE.width * PICTURE.height; at += 1) {
      const shade = this.vignette[at] as number;
      for (let c = 0; c < 3; c += 1)
        out[3 * at + c] = developed(
          ((room[12 * at + c] ?? 0) + (room[12 * at + 3 + c] ?? 0)) * shade,
        );
    }
    return out;
  }

  private develop(frame: number): Uint8Array {
    const { light, grainOf, vignette } = this;
    const { room, grain, seed } = this.plan;
    const { shades, area } = this.roomShade;
    const start = grainStart(seed, frame);
    const out = new Uint8ClampedArray(this.emptyRooms[start % EMPTY_ROOMS] ?? []);
    const { left, top, right, bottom } = around(area, this.painted);
    for (let row = top; row < bottom; row += 1)
      for (let at = row * PICTURE.width + left; at < row * PICTURE.width + right; at += 1) {
        const covered = (light[4 * at + 3] as number) / EXPOSURES;
        const lamp = shades[2 * at] as number;
        const open = shades[2 * at + 1] as number;
        if (covered === 0 && lamp === 1 && open === 1) continue;
        const speck = grain * (grainOf[(start + at) & GRAIN_MASK] as number);
        const shade = vignette[at] as number;
        for (let c = 0; c < 3; c += 1) {
          const behind =
            (room[12 * at + c] as number) * lamp + (room[12 * at + 3 + c] as number) * open;
          const seen = (light[4 * at + c] as number) / EXPOSURES + (1 - covered) * behind;
          out[3 * at + c] = developed(seen * shade) + speck;
        }
      }
    return new Uint8Array(out.buffer);
  }
}

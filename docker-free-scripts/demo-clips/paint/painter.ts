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
  private readonly base: Uint8ClampedArray;

  constructor(private readonly plan: PainterPlan) {
    this.roomShade = new RoomShade(plan.room);
    this.grainOf = makeGrain(plan.seed);
    this.base = this.emptyRoom();
  }

  /**
   * The picture of one exposure. `postureAt(share)` gives the posture at a share of the exposure from
   * −½ to ½; `seen` is asked for the near depth afterwards by `hides`.
   */
  paint(frame: number, postureAt: (share: number) => Posture): Uint8Array {
    const { plan, light } = this;
    const middle = postureAt(0);
    this.place(middle);
    this.shadow.draw(this.surfaces);
    const room = this.roomShade.shade(this.shadow, blockersOf(middle.bones, this.intoRoom));
    const boxes: Box[] = [];
    const order = [0, 1, 3, 4, 2];
    light.fill(0);
    for (const exposure of order) {
      const posture = postureAt((exposure - (EXPOSURES - 1) / 2) / EXPOSURES);
      this.place(posture);
      shadeCrowding(this.surfaces, blockersOf(posture.bones, this.intoRoom));
      const box = this.project(OFFSETS[exposure] ?? [0, 0]);
      boxes.push(box);
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
    return this.develop(frame, room);
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

  private emptyRoom(): Uint8ClampedArray {
    const { room } = this.plan;
    const out = new Uint8ClampedArray(PICTURE.width * PICTURE.height * 3);
    for (let at = 0; at < PICTURE.width * PICTURE.height; at += 1) {
      const shade = this.vignette[at] as number;
      for (let c = 0; c < 3; c += 1)
        out[3 * at + c] = developed(
          ((room[12 * at + c] ?? 0) + (room[12 * at + 3 + c] ?? 0)) * shade,
        );
    }
    return out;
  }

  private develop(frame: number, shades: Float32Array): Uint8Array {
    const { light, grainOf, base } = this;
    const { room, grain, seed } = this.plan;
    const { width, height } = PICTURE;
    const out = new Uint8ClampedArray(width * height * 3);
    let noise = grainStart(seed, frame);
    for (let at = 0; at < width * height; at += 1) {
      const covered = (light[4 * at + 3] as number) / EXPOSURES;
      const lamp = shades[2 * at] as number;
      const open = shades[2 * at + 1] as number;
      noise = (noise + 1) & GRAIN_MASK;
      const speck = grain * (grainOf[noise] as number);
      if (covered === 0 && lamp === 1 && open === 1) {
        out[3 * at] = (base[3 * at] as number) + speck;
        out[3 * at + 1] = (base[3 * at + 1] as number) + speck;
        out[3 * at + 2] = (base[3 * at + 2] as number) + speck;
        continue;
      }
      const shade = this.vignette[at] as number;
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

import { cross, dot, sub, unit, type Vec } from '../model/vec.ts';
import { type Box, DepthPicture } from './fill.ts';
import type { Surfaces } from './surfaces.ts';

/** A broad window high on the picture's left, behind the camera; the rest of the light is the room's. */
export const LAMP: Vec = [2300, -2300, 3300];
export const LAMP_COLOUR = [1.28, 1.2, 1.08] as const;
export const SKY = [0.5, 0.52, 0.54] as const;
export const GROUND = [0.36, 0.31, 0.26] as const;

const MAP = 1024;
/** Half the side of the square the shadow picture covers around the person, mm. */
const REACH = 1350;
const CENTRE: Vec = [0, 0, 850];

export const TO_LAMP: Vec = unit(sub(LAMP, CENTRE));
const ACROSS: Vec = unit(cross([0, 0, 1], TO_LAMP));
const UPWARD: Vec = cross(TO_LAMP, ACROSS);

/** Half the breadth and the height of all the person ever takes from the lamp, mm. */
const BROAD = 760;
const TALL = 1150;

/** Whether the person could ever shade a point of the room that looks `spread` mm around itself. */
export const mayShade = (x: number, y: number, z: number, spread: number): boolean => {
  const point: Vec = [x - CENTRE[0], y - CENTRE[1], z - CENTRE[2]];
  return (
    Math.abs(dot(point, ACROSS)) < BROAD + spread && Math.abs(dot(point, UPWARD)) < TALL + spread
  );
};

/** Turns of the pattern of looks, so that neighbouring pixels do not repeat it. */
const TURNS = 16;

/** Offsets of `taps` looks on a unit disc (sunflower: equal areas, golden angle), every turn in a row. */
const discs = (taps: number): Float32Array =>
  Float32Array.from({ length: TURNS * taps * 2 }, (_, i) => {
    const tap = (i >> 1) % taps;
    const turn = Math.floor((i >> 1) / taps) / TURNS;
    const radius = Math.sqrt((tap + 0.5) / taps);
    const angle = 2.399963 * tap + 2 * Math.PI * turn;
    return radius * ((i & 1) === 0 ? Math.cos(angle) : Math.sin(angle));
  });
const FINE = discs(16);
const COARSE = discs(4);

/** What the lamp sees of the person: lit or not, for any point of the room. */
export class ShadowMap {
  private readonly picture = new DepthPicture(MAP, MAP);
  private edges: Box = { left: 0, top: 0, right: 0, bottom: 0 };

  draw(surfaces: Surfaces): void {
    const { picture } = this;
    picture.clear({ left: 0, top: 0, right: MAP, bottom: MAP });
    let [left, top, right, bottom] = [MAP, MAP, 0, 0];
    for (let p = 0; p < surfaces.pointCount; p += 1) {
      const point: Vec = [
        (surfaces.points[3 * p] ?? 0) - CENTRE[0],
        (surfaces.points[3 * p + 1] ?? 0) - CENTRE[1],
        (surfaces.points[3 * p + 2] ?? 0) - CENTRE[2],
      ];
      const x = (dot(point, ACROSS) / REACH + 1) * (MAP / 2);
      const y = (1 - dot(point, UPWARD) / REACH) * (MAP / 2);
      picture.x[p] = x;
      picture.y[p] = y;
      picture.w[p] = dot(point, TO_LAMP);
      left = Math.min(left, x);
      right = Math.max(right, x);
      top = Math.min(top, y);
      bottom = Math.max(bottom, y);
    }
    this.edges = { left, top, right, bottom };
    picture.fill(surfaces);
  }

  /**
   * Share of the lamp's light that arrives at a point, 0 to 1, from looks within `spread` mm: 16 of
   * them, or 4 where `coarse`. `turn`, a whole number, picks one of the turns of the pattern.
   */
  lit(x: number, y: number, z: number, spread: number, coarse: boolean, turn: number): number {
    const { near } = this.picture;
    const { edges } = this;
    const px = x - CENTRE[0];
    const py = y - CENTRE[1];
    const pz = z - CENTRE[2];
    const scale = MAP / 2 / REACH;
    const column = MAP / 2 + (px * ACROSS[0] + py * ACROSS[1] + pz * ACROSS[2]) * scale;
    const row = MAP / 2 - (px * UPWARD[0] + py * UPWARD[1] + pz * UPWARD[2]) * scale;
    const reach = spread * scale;
    if (column + reach < edges.left || column - reach > edges.right) return 1;
    if (row + reach < edges.top || row - reach > edges.bottom) return 1;
    const depth = px * TO_LAMP[0] + py * TO_LAMP[1] + pz * TO_LAMP[2] + 7;
    const disc = coarse ? COARSE : FINE;
    const taps = coarse ? 4 : 16;
    const start = (turn & (TURNS - 1)) * taps * 2;
    let open = 0;
    for (let tap = 0; tap < taps; tap += 1) {
      const c = (column + reach * (disc[start + 2 * tap] as number)) | 0;
      const r = (row + reach * (disc[start + 2 * tap + 1] as number)) | 0;
      if (c < 0 || r < 0 || c >= MAP || r >= MAP || (near[r * MAP + c] as number) < depth)
        open += 1;
    }
    return open / taps;
  }
}

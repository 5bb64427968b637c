import type { Vec } from '../model/vec.ts';

/** A cross-section of a limb or trunk. Lengths in mm. */
export interface Ring {
  readonly centre: Vec;
  readonly left: Vec;
  readonly forward: Vec;
  readonly halfWidth: number;
  readonly front: number;
  readonly back: number;
  /** 2 is an ellipse, more is squarer */
  readonly squareness: number;
  /** place along the surface, handed to the paint */
  readonly v: number;
}

const MOST_POINTS = 40_000;
const MOST_TRIANGLES = 80_000;

/**
 * The surfaces of one posture, refilled for every picture: points, outward normals, a place on the
 * surface (u around, 0 at the left and ¼ in front; v along) and triangles with the paint they carry.
 */
export class Surfaces {
  readonly points = new Float32Array(MOST_POINTS * 3);
  readonly normals = new Float32Array(MOST_POINTS * 3);
  readonly places = new Float32Array(MOST_POINTS * 2);
  /** light that other limbs leave to a point, 0 to 1 */
  readonly openness = new Float32Array(MOST_POINTS).fill(1);
  readonly parts = new Uint8Array(MOST_POINTS);
  readonly triangles = new Uint32Array(MOST_TRIANGLES * 3);
  readonly paints = new Uint8Array(MOST_TRIANGLES);
  pointCount = 0;
  triangleCount = 0;

  clear(): void {
    this.pointCount = 0;
    this.triangleCount = 0;
  }

  /**
   * A closed skin over the rings; each end is shut by a flat lid. Rings run along left × forward (for
   * a limb: downwards), or the skin is inside out.
   */
  tube(rings: readonly Ring[], segments: number, paint: number, part: number): void {
    const start = this.pointCount;
    const across = segments + 1;
    for (const ring of rings) this.addRing(ring, segments, part);
    this.smoothNormals(start, rings.length, across);
    for (let r = 0; r + 1 < rings.length; r += 1)
      for (let s = 0; s < segments; s += 1) {
        const a = start + r * across + s;
        this.addTriangle(a, a + 1, a + across, paint);
        this.addTriangle(a + 1, a + across + 1, a + across, paint);
      }
    this.lid(rings[0], start, segments, paint, part, true);
    this.lid(rings.at(-1), start + (rings.length - 1) * across, segments, paint, part, false);
  }

  private addRing(ring: Ring, segments: number, part: number): void {
    const power = 2 / ring.squareness;
    for (let s = 0; s <= segments; s += 1) {
      const turn = (s / segments) * 2 * Math.PI;
      const [c, d] = [Math.cos(turn), Math.sin(turn)];
      const l = ring.halfWidth * Math.sign(c) * Math.abs(c) ** power;
      const f = (d > 0 ? ring.front : ring.back) * Math.sign(d) * Math.abs(d) ** power;
      this.addPoint(
        ring.centre[0] + l * ring.left[0] + f * ring.forward[0],
        ring.centre[1] + l * ring.left[1] + f * ring.forward[1],
        ring.centre[2] + l * ring.left[2] + f * ring.forward[2],
        s / segments,
        ring.v,
        part,
      );
    }
  }

  private addPoint(x: number, y: number, z: number, u: number, v: number, part: number): number {
    const at = this.pointCount;
    this.pointCount += 1;
    this.points[at * 3] = x;
    this.points[at * 3 + 1] = y;
    this.points[at * 3 + 2] = z;
    this.places[at * 2] = u;
    this.places[at * 2 + 1] = v;
    this.parts[at] = part;
    return at;
  }

  private addTriangle(a: number, b: number, c: number, paint: number): void {
    const at = this.triangleCount * 3;
    this.triangles[at] = a;
    this.triangles[at + 1] = b;
    this.triangles[at + 2] = c;
    this.paints[this.triangleCount] = paint;
    this.triangleCount += 1;
  }

  /** Normals of the grid from the directions to its neighbours, closed around the seam. */
  private smoothNormals(start: number, rows: number, across: number): void {
    const { points, normals } = this;
    const segments = across - 1;
    for (let r = 0; r < rows; r += 1)
      for (let s = 0; s < across; s += 1) {
        const here = (start + r * across + s) * 3;
        const before = (start + r * across + ((s + segments - 1) % segments)) * 3;
        const after = (start + r * across + ((s + 1) % segments)) * 3;
        const under = (start + Math.max(0, r - 1) * across + s) * 3;
        const over = (start + Math.min(rows - 1, r + 1) * across + s) * 3;
        const ax = (points[after] as number) - (points[before] as number);
        const ay = (points[after + 1] as number) - (points[before + 1] as number);
        const az = (points[after + 2] as number) - (points[before + 2] as number);
        const bx = (points[over] as number) - (points[under] as number);
        const by = (points[over + 1] as number) - (points[under + 1] as number);
        const bz = (points[over + 2] as number) - (points[under + 2] as number);
        const nx = ay * bz - az * by;
        const ny = az * bx - ax * bz;
        const nz = ax * by - ay * bx;
        const size = Math.sqrt(nx * nx + ny * ny + nz * nz) || 1;
        normals[here] = nx / size;
        normals[here + 1] = ny / size;
        normals[here + 2] = nz / size;
      }
  }

  private lid(
    ring: Ring | undefined,
    first: number,
    segments: number,
    paint: number,
    part: number,
    atStart: boolean,
  ): void {
    if (ring === undefined) return;
    const [cx, cy, cz] = ring.centre;
    const hub = this.addPoint(cx, cy, cz, 0.25, ring.v, part);
    const { left: l, forward: f } = ring;
    const sign = atStart ? -1 : 1;
    const normal = [
      sign * (l[1] * f[2] - l[2] * f[1]),
      sign * (l[2] * f[0] - l[0] * f[2]),
      sign * (l[0] * f[1] - l[1] * f[0]),
    ];
    this.normals.set(normal, hub * 3);
    for (let s = 0; s < segments; s += 1)
      if (atStart) this.addTriangle(hub, first + s + 1, first + s, paint);
      else this.addTriangle(hub, first + s, first + s + 1, paint);
  }
}

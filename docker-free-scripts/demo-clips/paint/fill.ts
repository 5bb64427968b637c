import type { Surfaces } from './surfaces.ts';

/** Pixels of a picture, right and bottom edge excluded. */
export interface Box {
  readonly left: number;
  readonly top: number;
  readonly right: number;
  readonly bottom: number;
}

/** A depth picture: `near` grows towards the eye, `owner` is the triangle seen, −1 for none. */
export class DepthPicture {
  readonly near: Float32Array;
  readonly owner: Int32Array;
  /** place of each surface point in this picture */
  readonly x = new Float32Array(40_000);
  readonly y = new Float32Array(40_000);
  readonly w = new Float32Array(40_000);

  constructor(
    readonly width: number,
    readonly height: number,
  ) {
    this.near = new Float32Array(width * height);
    this.owner = new Int32Array(width * height).fill(-1);
  }

  clear(box: Box): void {
    for (let row = box.top; row < box.bottom; row += 1) {
      this.near.fill(-Infinity, row * this.width + box.left, row * this.width + box.right);
      this.owner.fill(-1, row * this.width + box.left, row * this.width + box.right);
    }
  }

  /** Draws every triangle that faces the eye. `x`, `y` and `w` of all points must be set. */
  fill(surfaces: Surfaces): void {
    const { x, y, w, near, owner, width, height } = this;
    const { triangles, triangleCount } = surfaces;
    for (let t = 0; t < triangleCount; t += 1) {
      const a = triangles[3 * t] as number;
      const b = triangles[3 * t + 1] as number;
      const c = triangles[3 * t + 2] as number;
      const ax = x[a] as number;
      const ay = y[a] as number;
      const bx = x[b] as number;
      const by = y[b] as number;
      const cx = x[c] as number;
      const cy = y[c] as number;
      // v runs down, so a triangle seen from outside has a negative area here
      const area = (bx - ax) * (cy - ay) - (by - ay) * (cx - ax);
      if (area >= 0) continue;
      const left = Math.max(0, Math.ceil(Math.min(ax, bx, cx) - 0.5));
      const right = Math.min(width - 1, Math.floor(Math.max(ax, bx, cx) - 0.5));
      const top = Math.max(0, Math.ceil(Math.min(ay, by, cy) - 0.5));
      const bottom = Math.min(height - 1, Math.floor(Math.max(ay, by, cy) - 0.5));
      if (left > right || top > bottom) continue;
      const inverse = 1 / area;
      const aw = w[a] as number;
      const bw = w[b] as number;
      const cw = w[c] as number;
      const stepB = (cy - ay) * inverse;
      const stepC = (ay - by) * inverse;
      const stepW = stepB * (bw - aw) + stepC * (cw - aw);
      for (let row = top; row <= bottom; row += 1) {
        const py = row + 0.5 - ay;
        const px = left + 0.5 - ax;
        let kb = (px * (cy - ay) - py * (cx - ax)) * inverse;
        let kc = (py * (bx - ax) - px * (by - ay)) * inverse;
        let depth = aw + kb * (bw - aw) + kc * (cw - aw);
        let at = row * width + left;
        for (let column = left; column <= right; column += 1, at += 1) {
          if (kb >= 0 && kc >= 0 && kb + kc <= 1 && depth > (near[at] as number)) {
            near[at] = depth;
            owner[at] = t;
          }
          kb += stepB;
          kc += stepC;
          depth += stepW;
        }
      }
    }
  }
}

/**
 * How a patch lies in a picture: turned, scaled and moved. The point (x, y) of the patch, counted
 * from its middle, is found at (c·x − s·y + tx, s·x + c·y + ty).
 */
export interface Warp {
  readonly c: number;
  readonly s: number;
  readonly tx: number;
  readonly ty: number;
}

export const atPlace = (tx: number, ty: number): Warp => ({ c: 1, s: 0, tx, ty });

export const movedTo = (warp: Warp, tx: number, ty: number): Warp => ({ ...warp, tx, ty });

export const scaleOf = (warp: Warp): number => Math.hypot(warp.c, warp.s);

/**
 * The warp before a small one of the patch is undone: `warp ∘ step⁻¹`, where the step sends the
 * patch's x to (1 + a)x − b·y + dx.
 */
export const undo = (warp: Warp, dx: number, dy: number, a: number, b: number): Warp => {
  const norm = (1 + a) * (1 + a) + b * b;
  const c = (warp.c * (1 + a) + warp.s * b) / norm;
  const s = (warp.s * (1 + a) - warp.c * b) / norm;
  return { c, s, tx: warp.tx - (c * dx - s * dy), ty: warp.ty - (s * dx + c * dy) };
};

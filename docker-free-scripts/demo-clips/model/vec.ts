/** A point or direction in millimetres: x forward, y to the athlete's left, z up. */
export type Vec = readonly [number, number, number];

/** Three orthonormal directions of a segment, each in the coordinates of the room. */
export interface Axes {
  /** towards the segment's front */
  readonly forward: Vec;
  /** towards the athlete's left */
  readonly left: Vec;
  /** along the segment, upwards in standing */
  readonly up: Vec;
}

export const RAD = Math.PI / 180;

export const add = (a: Vec, b: Vec): Vec => [a[0] + b[0], a[1] + b[1], a[2] + b[2]];
export const sub = (a: Vec, b: Vec): Vec => [a[0] - b[0], a[1] - b[1], a[2] - b[2]];
export const scale = (a: Vec, s: number): Vec => [a[0] * s, a[1] * s, a[2] * s];
export const dot = (a: Vec, b: Vec): number => a[0] * b[0] + a[1] * b[1] + a[2] * b[2];
export const length = (a: Vec): number => Math.sqrt(dot(a, a));
export const unit = (a: Vec): Vec => scale(a, 1 / length(a));
export const mix = (a: Vec, b: Vec, t: number): Vec => add(scale(a, 1 - t), scale(b, t));

export const cross = (a: Vec, b: Vec): Vec => [
  a[1] * b[2] - a[2] * b[1],
  a[2] * b[0] - a[0] * b[2],
  a[0] * b[1] - a[1] * b[0],
];

/** The point `forward`, `left` and `up` millimetres away from `origin` along the axes. */
export const along = (
  origin: Vec,
  axes: Axes,
  [forward, left, up]: readonly [number, number, number],
): Vec =>
  add(add(origin, scale(axes.forward, forward)), add(scale(axes.left, left), scale(axes.up, up)));

/**
 * Axes of a rigid block from its yaw (forward axis to the athlete's left positive), its pitch
 * (front up positive) and its roll (left side up positive), degrees. Yaw comes last, roll first, so
 * the azimuth of the forward axis is the yaw exactly, whatever pitch and roll are.
 */
export const axesFromAngles = (yaw: number, pitch: number, roll: number): Axes => {
  const [cy, sy] = [Math.cos(yaw * RAD), Math.sin(yaw * RAD)];
  const [cp, sp] = [Math.cos(pitch * RAD), Math.sin(pitch * RAD)];
  const [cr, sr] = [Math.cos(roll * RAD), Math.sin(roll * RAD)];
  const turned = (x: number, y: number, z: number): Vec => [cy * x - sy * y, sy * x + cy * y, z];
  return {
    forward: turned(cp, 0, sp),
    left: turned(-sp * sr, cr, cp * sr),
    up: turned(-sp * cr, -sr, cp * cr),
  };
};

/** Axes of a long bone along `up` whose forward axis has exactly the azimuth `yaw`, degrees. */
export const axesAlongBone = (up: Vec, yaw: number): Axes => {
  const flat: Vec = [Math.cos(yaw * RAD), Math.sin(yaw * RAD), 0];
  const forward = unit([flat[0], flat[1], -dot(flat, up) / up[2]]);
  return { forward, left: cross(up, forward), up };
};

/** Minimum-jerk step: 0 at 0, 1 at 1, at rest at both ends. */
export const ease = (t: number): number => {
  const x = Math.min(1, Math.max(0, t));
  return x * x * x * (10 - 15 * x + 6 * x * x);
};

/** mm. The athlete's space: x forward, y to the athlete's left, z up; the floor is z = 0. */
export type Vector = readonly [x: number, y: number, z: number];

/** Rows of a rotation. */
export type Turning = readonly [Vector, Vector, Vector];

export const plus = (a: Vector, b: Vector): Vector => [a[0] + b[0], a[1] + b[1], a[2] + b[2]];
export const minus = (a: Vector, b: Vector): Vector => [a[0] - b[0], a[1] - b[1], a[2] - b[2]];
export const times = (a: Vector, by: number): Vector => [a[0] * by, a[1] * by, a[2] * by];
export const middle = (a: Vector, b: Vector): Vector => times(plus(a, b), 0.5);

const dot = (a: Vector, b: Vector): number => a[0] * b[0] + a[1] * b[1] + a[2] * b[2];

export const apply = (r: Turning, a: Vector): Vector => [dot(r[0], a), dot(r[1], a), dot(r[2], a)];

/** First `b`, then `a`. */
export const after = (a: Turning, b: Turning): Turning => {
  const column = (i: 0 | 1 | 2): Vector => [b[0][i], b[1][i], b[2][i]];
  const row = (r: Vector): Vector => [dot(r, column(0)), dot(r, column(1)), dot(r, column(2))];
  return [row(a[0]), row(a[1]), row(a[2])];
};

const waves = (degrees: number): readonly [cos: number, sin: number] => [
  Math.cos((degrees * Math.PI) / 180),
  Math.sin((degrees * Math.PI) / 180),
];

/** About z, degrees: positive turns the forward axis to the athlete's left. */
export const yawed = (degrees: number): Turning => {
  const [c, s] = waves(degrees);
  return [
    [c, -s, 0],
    [s, c, 0],
    [0, 0, 1],
  ];
};

/** About x, degrees: positive raises the athlete's left. */
export const rolled = (degrees: number): Turning => {
  const [c, s] = waves(degrees);
  return [
    [1, 0, 0],
    [0, c, -s],
    [0, s, c],
  ];
};

/** About y, degrees: positive tips the upper end forward. */
export const pitched = (degrees: number): Turning => {
  const [c, s] = waves(degrees);
  return [
    [c, 0, s],
    [0, 1, 0],
    [-s, 0, c],
  ];
};

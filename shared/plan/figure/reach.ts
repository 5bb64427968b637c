/** A spot of a drawing: units forward of its middle, units above the floor; a body is some 180 tall and faces forward. */
export type Spot = readonly [forward: number, up: number];

const RIGHT_ANGLE = Math.PI / 2;

export const away = ([x, y]: Spot, angle: number, length: number): Spot => [
  x + length * Math.cos(angle),
  y + length * Math.sin(angle),
];

/**
 * Where the middle joint and the end of a limb of two parts are, when its end reaches for a spot. The joint lies to
 * the left of the way there (`bend` 1) or to its right (-1). What is out of reach is reached for with a straight limb.
 */
export const reach = (
  from: Spot,
  target: Spot,
  [first, second]: readonly [number, number],
  bend: 1 | -1,
): readonly [joint: Spot, end: Spot] => {
  const angle = Math.atan2(target[1] - from[1], target[0] - from[0]);
  const wanted = Math.hypot(target[0] - from[0], target[1] - from[1]);
  const distance = Math.min(Math.max(wanted, Math.abs(first - second)), first + second);
  const along = (first ** 2 - second ** 2 + distance ** 2) / (2 * distance);
  const aside = Math.sqrt(Math.max(0, first ** 2 - along ** 2));
  const joint = away(away(from, angle, along), angle + bend * RIGHT_ANGLE, aside);
  return [joint, away(from, angle, distance)];
};

/** A point of a drawing: x right, y down. */
export type Point = readonly [x: number, y: number];

const two = (value: number) => Number(value.toFixed(2));

/** The outline around two circles, as a path: how a thigh narrows to a knee. Radii in the drawing's units. */
export function taper(a: Point, b: Point, ra: number, rb: number): string {
  const [dx, dy] = [b[0] - a[0], b[1] - a[1]];
  const along = Math.atan2(dy, dx);
  // where the two circles' common tangents touch them
  const open = Math.acos((ra - rb) / Math.hypot(dx, dy));
  const at = (centre: Point, radius: number, angle: number) =>
    `${two(centre[0] + radius * Math.cos(angle))} ${two(centre[1] + radius * Math.sin(angle))}`;
  const farLarge = open > Math.PI / 2 ? 1 : 0;
  return [
    `M${at(a, ra, along + open)}`,
    `L${at(b, rb, along + open)}`,
    `A${rb} ${rb} 0 ${farLarge} 0 ${at(b, rb, along - open)}`,
    `L${at(a, ra, along - open)}`,
    `A${ra} ${ra} 0 ${1 - farLarge} 0 ${at(a, ra, along + open)}`,
    'Z',
  ].join('');
}

import { through } from '../model/turn-shapes.ts';
import { add, type Axes, scale, type Vec } from '../model/vec.ts';
import type { Ring } from '../paint/surfaces.ts';

/** One drawn cross-section: [place, half width, front, back, shift forward], mm at the norm height. */
export type Section = readonly [number, number, number, number, number];

export interface Shape {
  readonly places: readonly number[];
  readonly halfWidth: readonly number[];
  readonly front: readonly number[];
  readonly back: readonly number[];
  readonly shift: readonly number[];
}

/** Smooth curves through the drawn sections, sampled at `count` places, scaled, made `more` thicker. */
export const shapeOf = (
  sections: readonly Section[],
  count: number,
  size: number,
  more = 0,
): Shape => {
  const column = (index: number): readonly number[] => sections.map((row) => row[index] ?? 0);
  const x = column(0);
  const [first, last] = [x[0] ?? 0, x.at(-1) ?? 1];
  const places = Array.from(
    { length: count },
    (_, i) => first + ((last - first) * i) / (count - 1),
  );
  const curve = (index: number, extra: number): readonly number[] =>
    places.map((place) => through(x, column(index), place) * size + extra);
  return {
    places,
    halfWidth: curve(1, more),
    front: curve(2, more),
    back: curve(3, more),
    shift: curve(4, 0),
  };
};

/** The ring of a shape's sample `index` around `centre`. */
export const ringOf = (
  shape: Shape,
  index: number,
  centre: Vec,
  axes: Axes,
  squareness = 2,
): Ring => ({
  centre: add(centre, scale(axes.forward, shape.shift[index] ?? 0)),
  left: axes.left,
  forward: axes.forward,
  halfWidth: shape.halfWidth[index] ?? 0,
  front: shape.front[index] ?? 0,
  back: shape.back[index] ?? 0,
  squareness,
  v: shape.places[index] ?? 0,
});

/** A ball or egg: rings of shrinking size, from the top of `axes.up` downwards. */
export const eggRings = (
  centre: Vec,
  axes: Axes,
  [halfWidth, halfDepth, halfHeight]: readonly [number, number, number],
  count = 9,
): readonly Ring[] =>
  Array.from({ length: count }, (_, i) => {
    const angle = Math.PI * (0.5 - i / (count - 1));
    const round = Math.max(0.02, Math.cos(angle));
    return {
      centre: add(centre, scale(axes.up, halfHeight * Math.sin(angle))),
      left: axes.left,
      forward: axes.forward,
      halfWidth: halfWidth * round,
      front: halfDepth * round,
      back: halfDepth * round,
      squareness: 2,
      v: i / (count - 1),
    };
  });

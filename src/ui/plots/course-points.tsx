import { symbol, symbolCircle, symbolSquare, symbolTriangle } from 'd3-shape';
import { cx } from '../class-names.ts';
import type { CourseScale } from '#shared/plots/course-scale.ts';

export interface CoursePoint {
  readonly lift: number;
  readonly turn: number;
  /** Place of its rep among those shown, from 0: dot, triangle, square, then again. */
  readonly rep: number;
  /** Rests on marks that nobody has looked at: provisional. */
  readonly hollow: boolean;
}

const SHAPES = [symbolCircle, symbolTriangle, symbolSquare];
const AREA = 46;

/** The path of a rep's symbol about 0,0. */
export const repSymbol = (rep: number): string =>
  symbol(SHAPES[rep % SHAPES.length] ?? symbolCircle, AREA)() ?? '';

export function CoursePoints({
  points,
  scale,
}: {
  points: readonly CoursePoint[];
  scale: CourseScale;
}) {
  return (
    <g>
      {points.map((point, n) => (
        <path
          key={n}
          d={repSymbol(point.rep)}
          transform={`translate(${scale.x(point.lift)} ${scale.y(point.turn)})`}
          strokeWidth={point.hollow ? 1.5 : 1}
          className={cx(point.hollow ? 'fill-mud stroke-shank' : 'fill-shank stroke-sheet')}
        />
      ))}
    </g>
  );
}

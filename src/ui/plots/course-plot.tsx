import { useRef, type ReactNode } from 'react';
import type { Gates } from '#shared/protocol/protocol.ts';
import { turnAt } from '#shared/reading/at-lift.ts';
import { CourseAxes } from './course-axes.tsx';
import { CourseLine, CourseRepLine } from './course-line.tsx';
import { CoursePoints, type CoursePoint } from './course-points.tsx';
import { courseScale, type CourseScale } from '#shared/plots/course-scale.ts';
import { type CourseCurve, turnsToHold } from '#shared/plots/course-shapes.ts';
import { CourseWedge } from './course-wedge.tsx';
import { useWidth } from './use-width.ts';

export interface CoursePlotProps {
  /** What the plot shows, for those who cannot see it; say the figures too. */
  label: string;
  height?: number;
  gates: Gates;
  /** The line of all reps, or of one; empty where nothing can be fitted yet. */
  curve: CourseCurve;
  /** The reps behind it, where there are several. */
  repCurves?: readonly CourseCurve[];
  points: readonly CoursePoint[];
  /** Further turns that have to fit, so that two plots share their scale. */
  reach?: readonly number[];
  /** One or two sentences where there is nothing to draw yet. */
  empty?: readonly string[];
  /** Drawn over the course: markers, brackets, tags. */
  children?: (scale: CourseScale) => ReactNode;
}

/**
 * Turn against lift, the product's central picture, redrawn for the width it gets. The band is the
 * 95 % band under our error model; the wedge is what is expected from this course's value at the lower gate.
 */
export function CoursePlot({
  label,
  height,
  gates,
  curve,
  repCurves = [],
  points,
  reach = [],
  empty,
  children,
}: CoursePlotProps) {
  const box = useRef<HTMLDivElement>(null);
  const width = useWidth(box);
  const drawn = height ?? (width !== null && width < 440 ? 296 : 372);
  return (
    <div ref={box} style={{ minHeight: drawn }}>
      {width !== null && width > 0 && (
        <CourseDrawing
          {...{ label, curve, repCurves, points, empty, children }}
          scale={courseScale(
            width,
            drawn,
            [
              ...[points, ...repCurves].flat().map(({ turn }) => turn),
              ...turnsToHold(curve, gates),
              ...reach,
            ],
            gates,
          )}
        />
      )}
    </div>
  );
}

function CourseDrawing({
  label,
  curve,
  repCurves = [],
  points,
  empty,
  children,
  scale,
}: Omit<CoursePlotProps, 'height' | 'gates' | 'reach'> & { scale: CourseScale }) {
  const atFrom = turnAt(curve, scale.gates.from);
  const { width, height, top, bottom, left, right } = scale;
  return (
    <svg
      className="plot"
      width={width}
      height={height}
      viewBox={`0 0 ${width} ${height}`}
      role="img"
      aria-label={label}
    >
      {atFrom !== null && <CourseWedge atFrom={atFrom} scale={scale} />}
      <CourseAxes scale={scale} />
      {repCurves.map((each, n) => (
        <CourseRepLine key={n} curve={each} scale={scale} />
      ))}
      {curve.length > 1 && <CourseLine curve={curve} scale={scale} />}
      <CoursePoints points={points} scale={scale} />
      {empty?.map((line, n) => (
        <text
          key={line}
          x={(left + right) / 2}
          y={top + (bottom - top) * 0.76 + n * 22}
          textAnchor="middle"
          className={`plot-over text-body ${n === 0 ? 'plot-strong' : 'fill-ink'}`}
        >
          {line}
        </text>
      ))}
      {children?.(scale)}
    </svg>
  );
}

import type { CourseScale } from '#shared/plots/course-scale.ts';
import { bandPath, type CourseCurve, linePath, runsOf } from '#shared/plots/course-shapes.ts';
import { PlotWindow } from './plot-window.tsx';

/** The fit with its 95 % band; dotted where no marked frame carries it. */
export function CourseLine({
  curve,
  scale,
  band = true,
}: {
  curve: CourseCurve;
  scale: CourseScale;
  band?: boolean;
}) {
  return (
    <g>
      {band && (
        <PlotWindow scale={scale}>
          <path d={bandPath(curve, scale)} className="fill-shank/[.13]" />
        </PlotWindow>
      )}
      {runsOf(curve).map((run, n) => (
        <path
          key={n}
          d={linePath(run.points, scale)}
          fill="none"
          strokeWidth="2.5"
          strokeLinecap="round"
          strokeLinejoin="round"
          strokeDasharray={run.carried ? undefined : '1 6'}
          className="stroke-shank"
        />
      ))}
    </g>
  );
}

/** One rep of several: thin, behind the line of all. */
export function CourseRepLine({ curve, scale }: { curve: CourseCurve; scale: CourseScale }) {
  return (
    <path d={linePath(curve, scale)} fill="none" strokeWidth="1.25" className="stroke-shank/60" />
  );
}

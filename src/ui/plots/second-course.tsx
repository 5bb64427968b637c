import type { CourseScale } from '#shared/plots/course-scale.ts';
import { bandPath, type CourseCurve, linePath, runsOf } from '#shared/plots/course-shapes.ts';
import { PlotWindow } from './plot-window.tsx';

/** A course laid over another one: dashed and in ink, its band by its edges alone. */
export function SecondCourse({ curve, scale }: { curve: CourseCurve; scale: CourseScale }) {
  if (curve.length < 2) return null;
  return (
    <g>
      <PlotWindow scale={scale}>
        <path
          d={bandPath(curve, scale)}
          className="fill-ink/[.07] stroke-ink/50"
          strokeWidth="1"
          strokeDasharray="2 3"
        />
      </PlotWindow>
      {runsOf(curve).map((run, n) => (
        <path
          key={n}
          d={linePath(run.points, scale)}
          fill="none"
          strokeWidth="2.5"
          strokeLinecap="butt"
          strokeLinejoin="round"
          strokeDasharray={run.carried ? '9 5' : '1 6'}
          className="stroke-ink"
        />
      ))}
    </g>
  );
}

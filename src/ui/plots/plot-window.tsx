import { type ReactNode, useId } from 'react';
import type { CourseScale } from '#shared/plots/course-scale.ts';

/** What may be wider than the plot: it ends at the plot's edges. */
export function PlotWindow({
  scale: { left, right, top, bottom },
  children,
}: {
  scale: CourseScale;
  children: ReactNode;
}) {
  const id = useId();
  return (
    <g clipPath={`url(#${id})`}>
      <clipPath id={id}>
        <rect x={left} y={top} width={right - left} height={bottom - top} />
      </clipPath>
      {children}
    </g>
  );
}

import { useId } from 'react';
import type { CourseScale } from '#shared/plots/course-scale.ts';
import { WEDGE, wedgePath } from '#shared/plots/course-shapes.ts';
import { Hatch } from './hatch.tsx';

/** Of the words 'holds: not a pass', px. */
const HOLDS_WIDTH = 104;

/**
 * What would be expected between the gates, from this course's own value at the lower one. Green is turning
 * in only; holding still is a neutral hatch, for it is not a pass. It judges the change, not the height.
 */
export function CourseWedge({ atFrom, scale }: { atFrom: number; scale: CourseScale }) {
  const id = useId();
  const { x, y, compact, gates } = scale;
  const middle = (x(gates.from) + 2 * x(gates.to)) / 3;
  return (
    <g>
      <defs>
        <Hatch id={`${id}in`} className="stroke-reed/35" />
        <Hatch id={`${id}still`} className="stroke-edge" gap={5} />
      </defs>
      <path d={wedgePath(atFrom, WEDGE.in, scale)} className="fill-reed-pale/70" />
      <path
        d={wedgePath(atFrom, WEDGE.in, scale)}
        fill={`url(#${id}in)`}
        className="stroke-reed"
        strokeWidth="1"
      />
      <path
        d={wedgePath(atFrom, WEDGE.still, scale)}
        fill={`url(#${id}still)`}
        className="stroke-edge"
        strokeWidth="0.75"
      />
      {!compact && (
        <>
          <text
            x={middle}
            y={y(atFrom - 4.6)}
            textAnchor="middle"
            className="plot-over fill-reed font-bold"
          >
            expected
          </text>
          {x(gates.to) + 18 + HOLDS_WIDTH < scale.right && (
            <text x={x(gates.to) + 18} y={y(atFrom) + 5} className="plot-over">
              holds: not a pass
            </text>
          )}
        </>
      )}
    </g>
  );
}

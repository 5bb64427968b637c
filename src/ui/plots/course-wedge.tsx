import { useId } from 'react';
import type { CourseScale } from './course-scale.ts';
import { WEDGE, wedgePath } from './course-shapes.ts';
import { Hatch } from './hatch.tsx';

/** Of the words 'holds: not a pass', px. */
const HOLDS_WIDTH = 104;

/**
 * What would be expected between 60° and 90°, from this course's own value at 60°. Green is turning
 * in only; holding still is a neutral hatch, for it is not a pass. It judges the change, not the height.
 */
export function CourseWedge({ at60, scale }: { at60: number; scale: CourseScale }) {
  const id = useId();
  const { x, y, compact } = scale;
  const middle = (x(60) + 2 * x(90)) / 3;
  return (
    <g>
      <defs>
        <Hatch id={`${id}in`} className="stroke-reed/35" />
        <Hatch id={`${id}still`} className="stroke-edge" gap={5} />
      </defs>
      <path d={wedgePath(at60, WEDGE.in, scale)} className="fill-reed-pale/70" />
      <path
        d={wedgePath(at60, WEDGE.in, scale)}
        fill={`url(#${id}in)`}
        className="stroke-reed"
        strokeWidth="1"
      />
      <path
        d={wedgePath(at60, WEDGE.still, scale)}
        fill={`url(#${id}still)`}
        className="stroke-edge"
        strokeWidth="0.75"
      />
      {!compact && (
        <>
          <text
            x={middle}
            y={y(at60 - 4.6)}
            textAnchor="middle"
            className="plot-over fill-reed font-bold"
          >
            expected
          </text>
          {x(90) + 18 + HOLDS_WIDTH < scale.right && (
            <text x={x(90) + 18} y={y(at60) + 5} className="plot-over">
              holds: not a pass
            </text>
          )}
        </>
      )}
    </g>
  );
}

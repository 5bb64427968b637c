import { decimal } from '../figures.ts';
import type { CourseScale } from '#shared/plots/course-scale.ts';

const signed = (value: number) => `${value > 0 ? '+' : ''}${decimal(value, 0)}`;

/** Axes, the named zero, and both gates as dotted ink lines with bold ticks. */
export function CourseAxes({ scale }: { scale: CourseScale }) {
  const { x, y, left, right, top, bottom, compact, xTicks, yTicks } = scale;
  const gates: readonly number[] = [scale.gates.from, scale.gates.to];
  return (
    <g>
      {yTicks.map((tick) => (
        <g key={tick}>
          <path
            d={`M${left} ${y(tick)}H${right}`}
            className={tick === 0 ? 'plot-zero' : 'plot-grid'}
          />
          <text x={left - 8} y={y(tick) + 5} textAnchor="end">
            {signed(tick)}
          </text>
        </g>
      ))}
      <path d={`M${left} ${bottom}H${right}`} className="plot-axis" />
      {gates.map((gate) => (
        <path key={gate} d={`M${x(gate)} ${top - 6}V${bottom}`} className="plot-gate" />
      ))}
      {xTicks.map((tick) => {
        const gate = gates.includes(tick);
        return (
          <g key={tick}>
            <path
              d={`M${x(tick)} ${bottom}v${gate ? 7 : 5}`}
              className="plot-axis"
              strokeWidth={gate ? 2 : 1}
            />
            <text
              x={x(tick)}
              y={bottom + 22}
              textAnchor="middle"
              className={gate ? 'plot-strong' : undefined}
            >
              {tick}°
            </text>
          </g>
        );
      })}
      <text x={0} y={12}>
        {compact ? 'turn, degrees' : 'turn of the support hip, degrees'}
      </text>
      <text x={right} y={bottom + 42} textAnchor="end">
        {compact ? 'lift' : 'lift: lifted thigh from the vertical, degrees'}
      </text>
      {!compact && (
        <>
          <text x={left + 8} y={top + 14} className="plot-over">
            turns out (external) ↑
          </text>
          <text x={left + 8} y={bottom - 10} className="plot-over">
            turns in (internal) ↓
          </text>
          <text x={left + 8} y={y(0) - 7} className="plot-over">
            0 = quiet stance
          </text>
        </>
      )}
    </g>
  );
}

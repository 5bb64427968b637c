import { useRef } from 'react';
import { decimal, turn } from '../figures.ts';
import { type AgreementScale, agreementScale } from './agreement-scale.ts';
import { useWidth } from './use-width.ts';

export interface AgreementPlotProps {
  /** What the plot shows, for those who cannot see it; say the figures too. */
  label: string;
  /** What is measured, as on the axis below: `turn`. */
  what: string;
  points: readonly { readonly mean: number; readonly difference: number }[];
  limits: {
    readonly bias: number;
    readonly low: number;
    readonly high: number;
  } | null;
}

/** First less second against the mean of both, with the bias and the limits that hold 95 % of differences. */
export function AgreementPlot({ label, what, points, limits }: AgreementPlotProps) {
  const box = useRef<HTMLDivElement>(null);
  const width = useWidth(box);
  const height = width !== null && width < 440 ? 240 : 280;
  const means = points.map(({ mean }) => mean);
  const differences = [
    ...points.map(({ difference }) => difference),
    ...(limits ? [limits.low, limits.high] : []),
  ];
  return (
    <div ref={box} style={{ minHeight: height }}>
      {width !== null && width > 0 && points.length > 0 && (
        <Drawing
          {...{ label, what, points, limits }}
          scale={agreementScale(width, height, means, differences)}
        />
      )}
    </div>
  );
}

function Drawing({
  label,
  what,
  points,
  limits,
  scale,
}: AgreementPlotProps & { scale: AgreementScale }) {
  const { width, height, left, right, bottom, x, y, compact } = scale;
  const lines = limits
    ? [
        { at: limits.high, name: 'upper limit', strong: false },
        { at: limits.bias, name: 'bias', strong: true },
        { at: limits.low, name: 'lower limit', strong: false },
      ]
    : [];
  return (
    <svg
      className="plot"
      width={width}
      height={height}
      viewBox={`0 0 ${width} ${height}`}
      role="img"
      aria-label={label}
    >
      {scale.yTicks.map((tick) => (
        <g key={tick}>
          <path
            d={`M${left} ${y(tick)}H${right}`}
            className={tick === 0 ? 'plot-zero' : 'plot-grid'}
          />
          <text x={left - 8} y={y(tick) + 5} textAnchor="end">
            {decimal(tick, Number.isInteger(tick) ? 0 : 1)}
          </text>
        </g>
      ))}
      <path d={`M${left} ${bottom}H${right}`} className="plot-axis" />
      {scale.xTicks.map((tick) => (
        <g key={tick}>
          <path d={`M${x(tick)} ${bottom}v5`} className="plot-axis" />
          <text x={x(tick)} y={bottom + 20} textAnchor="middle">
            {decimal(tick, Number.isInteger(tick) ? 0 : 1)}°
          </text>
        </g>
      ))}
      {lines.map(({ at, name, strong }) => (
        <g key={name}>
          <path
            d={`M${left} ${y(at)}H${right}`}
            className="stroke-ink"
            strokeWidth={strong ? 2 : 1.5}
            strokeDasharray={strong ? undefined : '6 4'}
          />
          <text x={right + 6} y={y(at) + 5}>
            {compact ? turn(at) : `${name} ${turn(at)}`}
          </text>
        </g>
      ))}
      {points.map(({ mean, difference }, n) => (
        <circle
          key={n}
          cx={x(mean)}
          cy={y(difference)}
          r={4}
          className="fill-mud stroke-ink"
          strokeWidth={1.6}
        />
      ))}
      <text x={0} y={14}>
        first less second, degrees
      </text>
      <text x={right} y={bottom + 40} textAnchor="end">
        {what}, mean of both markings
      </text>
    </svg>
  );
}

import { useRef } from 'react';
import { cx } from '../class-names.ts';
import { repSymbol } from './course-points.tsx';
import type { LiftCurve, LiftPoint } from './lift-curve.ts';
import { type LiftScale, liftScale } from './lift-scale.ts';
import { useWidth } from './use-width.ts';
import type { Gates } from '#shared/protocol/protocol.ts';

/** Lift against time, with both gates drawn through it, redrawn for the width it gets. */
export function LiftPlot({
  label,
  curves,
  gates,
  height = 300,
}: {
  /** What the plot shows, for those who cannot see it; say the figures too. */
  label: string;
  curves: readonly LiftCurve[];
  gates: Gates;
  height?: number;
}) {
  const box = useRef<HTMLDivElement>(null);
  const width = useWidth(box);
  return (
    <div ref={box} style={{ minHeight: height }}>
      {width !== null && width > 0 && (
        <Drawing
          label={label}
          curves={curves}
          gates={gates}
          scale={liftScale(width, height, curves)}
        />
      )}
    </div>
  );
}

/** Apart from the gates, so that the figures do not run into each other. */
const TICK_ROOM = 8;

function Drawing({
  label,
  curves,
  gates,
  scale,
}: {
  label: string;
  curves: readonly LiftCurve[];
  gates: Gates;
  scale: LiftScale;
}) {
  const { width, height, left, right, top, bottom, x, y, xTicks, yTicks, compact } = scale;
  const named: readonly number[] = [gates.from, gates.to];
  const apart = yTicks.filter((tick) => named.every((gate) => Math.abs(tick - gate) >= TICK_ROOM));
  const fromFootOff = curves.every((curve) => curve.fromFootOff);
  return (
    <svg
      className="plot"
      width={width}
      height={height}
      viewBox={`0 0 ${width} ${height}`}
      role="img"
      aria-label={label}
    >
      {[...apart, ...named].map((tick) => (
        <g key={tick}>
          <path
            d={`M${left} ${y(tick)}H${right}`}
            className={named.includes(tick) ? 'plot-gate' : 'plot-grid'}
          />
          <text
            x={left - 8}
            y={y(tick) + 5}
            textAnchor="end"
            className={named.includes(tick) ? 'plot-strong' : undefined}
          >
            {tick}°
          </text>
        </g>
      ))}
      <path d={`M${left} ${bottom}H${right}`} className="plot-axis" />
      {xTicks.map((tick) => (
        <g key={tick}>
          <path d={`M${x(tick)} ${bottom}v5`} className="plot-axis" />
          <text x={x(tick)} y={bottom + 22} textAnchor="middle">
            {tick} s
          </text>
        </g>
      ))}
      {fromFootOff && <path d={`M${x(0)} ${top}V${bottom}`} className="plot-zero" />}
      {curves.map((curve, n) => (
        <Curve key={n} curve={curve} place={n} scale={scale} />
      ))}
      <text x={0} y={12}>
        {compact ? 'lift, degrees' : 'lift: lifted thigh from the vertical, degrees'}
      </text>
      <text x={right} y={bottom + 42} textAnchor="end">
        {fromFootOff ? 'seconds from foot off' : 'seconds from the first marked frame'}
      </text>
    </svg>
  );
}

/** Points that one line joins. */
const runsOf = (points: readonly LiftPoint[]): LiftPoint[][] => {
  const runs: LiftPoint[][] = [];
  for (const point of points) {
    const last = runs.at(-1);
    if (last && !point.startsRun) last.push(point);
    else runs.push([point]);
  }
  return runs;
};

function Curve({ curve, place, scale }: { curve: LiftCurve; place: number; scale: LiftScale }) {
  const { x, y } = scale;
  const path = (at: readonly (readonly [number, number])[]) =>
    at.map(([time, lift], n) => `${n === 0 ? 'M' : 'L'}${x(time)} ${y(lift)}`).join('');
  return (
    <g>
      {runsOf(curve.points).map((run, n) => {
        const known = run.filter(({ halfWidth }) => halfWidth !== null);
        const edge = (sign: 1 | -1) =>
          known.map(({ time, line, halfWidth }) => [time, line + sign * (halfWidth ?? 0)] as const);
        return (
          <g key={n}>
            {known.length > 1 && (
              <path
                d={`${path([...edge(1), ...edge(-1).reverse()])}Z`}
                className="fill-tide/[.13]"
              />
            )}
            <path
              d={path(run.map(({ time, line }) => [time, line]))}
              fill="none"
              strokeWidth="2.5"
              strokeLinecap="round"
              strokeLinejoin="round"
              className="stroke-tide"
            />
          </g>
        );
      })}
      {curve.points.map(({ time, lift, hollow }, n) => (
        <path
          key={n}
          d={repSymbol(place)}
          transform={`translate(${x(time)} ${y(lift)}) scale(0.7)`}
          strokeWidth={hollow ? 2 : 1.4}
          className={cx(hollow ? 'fill-mud stroke-tide' : 'fill-tide stroke-sheet')}
        />
      ))}
    </g>
  );
}

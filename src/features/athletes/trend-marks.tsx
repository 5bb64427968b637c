import type { Side } from '#shared/contracts/primitives.ts';
import { dayNumber, type Trend, type TrendPoint } from './trend.ts';

/** From data to pixels. */
type Scale = (value: number) => number;

/** Sides differ by the way their triangle points and by words, never by a colour. */
export function SideLine({
  side,
  points,
  x,
  y,
}: {
  side: Side;
  points: readonly TrendPoint[];
  x: Scale;
  y: Scale;
}) {
  // two sides of one day stand beside each other
  const shift = side === 'right' ? 4 : -4;
  const at = (point: TrendPoint) => x(dayNumber(point.day)) + shift;
  return (
    <g className="stroke-ink">
      <path
        d={points
          .map((point, n) => `${n === 0 ? 'M' : 'L'}${at(point)} ${y(point.change)}`)
          .join('')}
        fill="none"
        strokeDasharray="1 4"
      />
      {points.map((point) => (
        <g key={point.visitId} strokeWidth="1.5">
          <path
            fill="none"
            d={`M${at(point)} ${y(point.change - point.plusMinus)}V${y(point.change + point.plusMinus)}m-5 0h10M${at(point) - 5} ${y(point.change - point.plusMinus)}h10`}
          />
          <Triangle side={side} x={at(point)} y={y(point.change)} hollow={point.provisional} />
        </g>
      ))}
    </g>
  );
}

function Triangle({
  side,
  x,
  y,
  hollow = false,
}: {
  side: Side;
  x: number;
  y: number;
  hollow?: boolean;
}) {
  const d = side === 'right' ? 'M-4.5-6 6 0-4.5 6z' : 'M4.5-6-6 0 4.5 6z';
  return (
    <path
      d={d}
      transform={`translate(${x} ${y})`}
      className={hollow ? 'fill-mud stroke-ink' : 'fill-ink stroke-ink'}
      strokeWidth="1.5"
    />
  );
}

/** Words at the last points; where both sides end close together, they are moved apart. */
export function EndWords({ trend, x, y }: { trend: Trend; x: number; y: Scale }) {
  const ends = (['right', 'left'] as const)
    .flatMap((side) => {
      const point = trend[side].at(-1);
      return point ? [{ side, point, top: y(point.change) }] : [];
    })
    .sort((a, b) => a.top - b.top);
  const [upper, lower] = ends;
  const gap = 44;
  if (upper && lower && lower.top - upper.top < gap) {
    const middle = (upper.top + lower.top) / 2;
    upper.top = middle - gap / 2;
    lower.top = middle + gap / 2;
  }
  return ends.map(({ side, point, top }) => (
    <g key={side}>
      <Triangle side={side} x={x + 6} y={top - 4} />
      <text x={x + 20} y={top} className="plot-strong plot-over">
        standing on the {side}
      </text>
      <text x={x + 20} y={top + 18} className="plot-over">
        {point.label.toLowerCase()}
      </text>
    </g>
  ));
}

export function NarrowWords({ trend, x, y }: { trend: Trend; x: Scale; y: Scale }) {
  return (['right', 'left'] as const).map((side) => {
    const point = trend[side][0];
    if (point === undefined) return null;
    const other = trend[side === 'right' ? 'left' : 'right'][0];
    const above = other === undefined || point.change >= other.change;
    const edge = point.change + (above ? point.plusMinus : -point.plusMinus);
    const left = x(dayNumber(point.day)) - 22;
    const base = y(edge) + (above ? -8 : 18);
    return (
      <g key={side}>
        <Triangle side={side} x={left + 6} y={base - 5} />
        <text x={left + 17} y={base} className="plot-strong plot-over">
          standing on the {side}
        </text>
      </g>
    );
  });
}

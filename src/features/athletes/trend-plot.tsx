import { scaleLinear } from 'd3-scale';
import { useId, useRef } from 'react';
import { shortDay } from '#src/ui/days.ts';
import { decimal } from '#src/ui/figures.ts';
import { Hatch } from '#src/ui/plots/hatch.tsx';
import { useWidth } from '#src/ui/plots/use-width.ts';
import { gateRange } from '#src/ui/gate-words.ts';
import type { Gates } from '#shared/protocol/protocol.ts';
import { EndWords, NarrowWords, SideLine } from './trend-marks.tsx';
import { dayNumber, turnBounds, type Trend } from './trend.ts';

const HEIGHT = 300;
const TOP = 24;
const BOTTOM = 30;
const LEFT = 38;
/** Room for the words at the last points; narrow pages put them into the plot. */
const WORDS = 176;
const NARROW = 520;
/** Beyond so many degrees a turn counts as one: the reading's own threshold. */
const MARGIN_DEG = 1;

/** Turn from gate to gate over the visits, both sides, with 95 % errors. Redrawn for its width. */
export function TrendPlot({ trend, gates }: { trend: Trend; gates: Gates }) {
  const box = useRef<HTMLDivElement>(null);
  const width = useWidth(box);
  return (
    <div ref={box} style={{ minHeight: HEIGHT }}>
      {width !== null && width > WORDS && <Drawing trend={trend} gates={gates} width={width} />}
    </div>
  );
}

function Drawing({ trend, gates, width }: { trend: Trend; gates: Gates; width: number }) {
  const id = useId();
  const narrow = width < NARROW;
  const right = width - (narrow ? 8 : WORDS);
  const days = [...new Set([...trend.right, ...trend.left].map(({ day }) => day))].sort();
  const numbers = days.map(dayNumber);
  const first = numbers[0] ?? 0;
  const last = numbers.at(-1) ?? first;
  const x = scaleLinear(first === last ? [first - 1, last + 1] : [first, last], [
    LEFT + 28,
    right - 28,
  ]);
  const bounds = turnBounds(trend);
  const y = scaleLinear(bounds, [HEIGHT - BOTTOM, TOP]);
  const ticks = y.ticks(5).filter((tick) => tick % 5 === 0);
  return (
    <svg width={width} height={HEIGHT} className="plot" aria-hidden="true">
      <defs>
        <Hatch id={`${id}in`} className="stroke-reed/35" />
        <Hatch id={`${id}still`} className="stroke-edge" gap={5} />
      </defs>
      <text x={0} y={12}>
        turn from {gateRange(gates)} of lift, degrees
        {narrow ? '' : ', with 95 % error'}
      </text>
      <Area
        x0={LEFT}
        x1={right}
        y0={y(-MARGIN_DEG)}
        y1={y(bounds[0])}
        fill={`url(#${id}in)`}
        line="stroke-reed"
      />
      <Area
        x0={LEFT}
        x1={right}
        y0={y(MARGIN_DEG)}
        y1={y(-MARGIN_DEG)}
        fill={`url(#${id}still)`}
        line="stroke-edge"
      />
      {ticks.map((tick) => (
        <g key={tick}>
          <path
            d={`M${LEFT} ${y(tick)}H${right}`}
            className={tick === 0 ? 'plot-zero' : 'plot-grid'}
          />
          <text x={LEFT - 8} y={y(tick) + 5} textAnchor="end">
            {tick > 0 ? `+${tick}` : decimal(tick, 0)}
          </text>
        </g>
      ))}
      <text
        x={right - 6}
        y={y(bounds[0]) - 8}
        textAnchor="end"
        className="plot-over fill-reed font-bold"
      >
        expected: turns in
      </text>
      {!narrow && (
        <text x={right + 10} y={y(0) + 5}>
          holds: not a pass
        </text>
      )}
      <path d={`M${LEFT} ${HEIGHT - BOTTOM}H${right}`} className="plot-axis" />
      <DayLabels days={days} x={x} narrow={narrow} />
      {(['right', 'left'] as const).map((side) => (
        <SideLine key={side} side={side} points={trend[side]} x={x} y={y} />
      ))}
      {!narrow && <EndWords trend={trend} x={right + 10} y={y} />}
      {narrow && <NarrowWords trend={trend} x={x} y={y} />}
    </svg>
  );
}

function Area({
  x0,
  x1,
  y0,
  y1,
  fill,
  line,
}: {
  x0: number;
  x1: number;
  y0: number;
  y1: number;
  fill: string;
  line: string;
}) {
  return (
    <rect
      x={x0}
      y={y0}
      width={x1 - x0}
      height={Math.max(0, y1 - y0)}
      fill={fill}
      className={line}
      strokeWidth="0.75"
    />
  );
}

/** Days that would run into their neighbour are left out; the last one always stands. */
function DayLabels({
  days,
  x,
  narrow,
}: {
  days: readonly string[];
  x: (day: number) => number;
  narrow: boolean;
}) {
  const room = narrow ? 64 : 96;
  const shown: string[] = [];
  for (const day of [...days].reverse()) {
    const next = shown.at(-1);
    if (next === undefined || x(dayNumber(next)) - x(dayNumber(day)) >= room) shown.push(day);
  }
  return days.map((day) => (
    <g key={day}>
      <path d={`M${x(dayNumber(day))} ${HEIGHT - BOTTOM}v5`} className="plot-axis" />
      {shown.includes(day) && (
        <text x={x(dayNumber(day))} y={HEIGHT - 8} textAnchor="middle">
          {narrow ? shortDay(day).replace(/(\p{L}{3})\p{L}+/u, '$1') : shortDay(day)}
        </text>
      )}
    </g>
  ));
}

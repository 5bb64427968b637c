import { area, curveMonotoneX, line } from 'd3-shape';
import { useId } from 'react';
import { Hatch } from '#src/ui/plots/hatch.tsx';
import type { Gates } from '#shared/protocol/protocol.ts';
import type { HillPoint } from '../model/hill.ts';
import type { StripLayout } from './strip-layout.ts';

const BLIND_BELOW = 20;

/** The rep as a hill whose height is the lift, with both gates drawn through it. */
export function StripHill({
  hill,
  layout,
  gates,
  fromFront,
  sayBlind,
}: {
  hill: readonly HillPoint[];
  layout: StripLayout;
  gates: Gates;
  fromFront: boolean;
  /** False where other words stand in the way. */
  sayBlind: boolean;
}) {
  const id = useId();
  const { x, y, base, left, right, compact } = layout;
  const x1 = (point: HillPoint) => x(point.frame);
  const y1 = (point: HillPoint) => y(Math.max(0, point.lift));
  const shape = area(x1, base, y1).curve(curveMonotoneX)([...hill]) ?? '';
  // under 20° the front view is blind: the ridge is drawn only where it is seen
  const ridge =
    line<HillPoint>(x1, y1)
      .defined((point) => !fromFront || point.lift >= BLIND_BELOW - 4)
      .curve(curveMonotoneX)([...hill]) ?? '';
  return (
    <g>
      <defs>
        <Hatch id={`${id}hatch`} className="stroke-edge/60" />
        <clipPath id={`${id}hill`}>
          <path d={shape} />
        </clipPath>
      </defs>
      <path d={shape} className="fill-[#E4E1D4]" />
      {fromFront && (
        <rect
          x={left}
          y={y(BLIND_BELOW)}
          width={Math.max(0, right - left)}
          height={base - y(BLIND_BELOW)}
          fill={`url(#${id}hatch)`}
          clipPath={`url(#${id}hill)`}
        />
      )}
      <path
        d={ridge}
        fill="none"
        strokeWidth="1.75"
        strokeLinejoin="round"
        className="stroke-ink"
      />
      {[gates.from, gates.to].map((gate) => (
        <g key={gate}>
          <path d={`M${left} ${y(gate)}H${right}`} className="plot-gate" />
          <text x={left - 6} y={y(gate) + 5} textAnchor="end" className="plot-strong">
            {gate}°
          </text>
        </g>
      ))}
      {fromFront && sayBlind && !compact && (
        <text x={left + 44} y={base - 24} className="plot-over">
          under 20° the front view is blind
        </text>
      )}
    </g>
  );
}

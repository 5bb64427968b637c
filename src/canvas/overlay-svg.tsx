import { toRadians } from '#shared/geometry/units.ts';
import { OVERLAY_COLOURS, OVERLAY_DASHES, OVERLAY_SIZES } from '#shared/overlay/style.ts';
import type { Arc, MarkShape, Primitive } from '#shared/overlay/types.ts';

const dash = (drawn: Primitive) =>
  drawn.state === 'tracked' ? OVERLAY_DASHES.tracked.join(' ') : undefined;

const arcPath = ({ centre, radius, from, to }: Arc): string => {
  const at = (angle: typeof from) =>
    `${centre.u + radius * Math.sin(toRadians(angle))} ${centre.v - radius * Math.cos(toRadians(angle))}`;
  const forward = (((to - from) % 360) + 360) % 360;
  return `M${at(from)}A${radius} ${radius} 0 0 ${forward > 180 ? 0 : 1} ${at(to)}`;
};

function MarkSvg({ shape }: { shape: MarkShape }) {
  const { ringRadius, diamondHalf: d, bracketHalf: b, bracketLip, mark } = OVERLAY_SIZES;
  const lip = b - bracketLip;
  return (
    <g
      transform={`translate(${shape.at.u} ${shape.at.v}) scale(.75)`}
      fill="none"
      strokeWidth={mark}
      strokeDasharray={dash(shape)}
      stroke={OVERLAY_COLOURS[shape.role]}
    >
      {shape.kind === 'ring' && <circle r={ringRadius} />}
      {shape.kind === 'diamond' && <path d={`M0 ${-d}L${d} 0 0 ${d} ${-d} 0Z`} />}
      {shape.kind === 'bracket' && (
        <path d={`M${-lip} ${-b}H${-b}V${b}H${-lip}M${lip} ${-b}H${b}V${b}H${lip}`} />
      )}
      {shape.state !== 'tracked' && (
        <circle r={OVERLAY_SIZES.dot} fill={OVERLAY_COLOURS[shape.role]} stroke="none" />
      )}
    </g>
  );
}

/** Overlay primitives as SVG, for drawings of their own such as the dials; one unit is one px. */
export function OverlaySvg({
  primitives,
  width,
  height,
  label,
  className,
}: {
  primitives: readonly Primitive[];
  width: number;
  height: number;
  label: string;
  className?: string;
}) {
  return (
    <svg
      width={width}
      height={height}
      viewBox={`0 0 ${width} ${height}`}
      role="img"
      aria-label={label}
      className={className}
      fill="none"
      strokeLinecap="round"
    >
      {primitives.map((drawn, n) => {
        const stroke = OVERLAY_COLOURS[drawn.role];
        const common = {
          stroke,
          strokeDasharray: dash(drawn),
          strokeWidth: drawn.state === 'tracked' ? OVERLAY_SIZES.tracked : OVERLAY_SIZES.line + 0.5,
        };
        switch (drawn.kind) {
          case 'line': {
            const { from, to } = drawn;
            return <path key={n} d={`M${from.u} ${from.v}L${to.u} ${to.v}`} {...common} />;
          }
          case 'stroke':
            return (
              <path
                key={n}
                d={`M${drawn.points.map(({ u, v }) => `${u} ${v}`).join('L')}`}
                strokeLinejoin="round"
                {...common}
              />
            );
          case 'arc':
            return <path key={n} d={arcPath(drawn)} {...common} />;
          case 'label':
            return (
              <text
                key={n}
                x={drawn.at.u}
                y={drawn.at.v}
                fontSize="14"
                fill={drawn.role === 'note' ? 'var(--color-dusk-soft)' : stroke}
                textAnchor={
                  drawn.towards === 'left' ? 'end' : drawn.towards === 'right' ? 'start' : 'middle'
                }
              >
                {drawn.text}
              </text>
            );
          case 'ring':
            if (drawn.radius !== null)
              return (
                <circle key={n} cx={drawn.at.u} cy={drawn.at.v} r={drawn.radius} {...common} />
              );
            return <MarkSvg key={n} shape={drawn} />;
          default:
            return <MarkSvg key={n} shape={drawn} />;
        }
      })}
    </svg>
  );
}

import type { ReactNode } from 'react';
import type { Point } from '#shared/geometry/taper.ts';

/** Every drawing of the guide: 320 × 200 units, about one to a pixel, on its own line of ground. */
export function Drawing({
  label,
  children,
}: {
  /** What the drawing shows, for those who do not see it. */
  label: string;
  children: ReactNode;
}) {
  return (
    <svg
      viewBox="0 0 320 200"
      role="img"
      aria-label={label}
      className="block h-auto w-full border-b border-rule"
      fill="none"
      stroke="var(--color-ink)"
      strokeWidth="1.6"
      strokeLinecap="round"
      strokeLinejoin="round"
    >
      {children}
    </svg>
  );
}

export function Floor({ y, from = 12, to = 308 }: { y: number; from?: number; to?: number }) {
  return <path d={`M${from} ${y}H${to}`} />;
}

export function Words({
  at,
  anchor = 'start',
  bold = false,
  children,
}: {
  at: Point;
  anchor?: 'start' | 'middle' | 'end';
  bold?: boolean;
  children: ReactNode;
}) {
  return (
    <text
      x={at[0]}
      y={at[1]}
      textAnchor={anchor}
      stroke="none"
      className={`text-[14px] ${bold ? 'fill-ink font-bold' : 'fill-soft'}`}
    >
      {children}
    </text>
  );
}

/** A measured length between two points, with small ends. */
export function Dimension({ from, to }: { from: Point; to: Point }) {
  const length = Math.hypot(to[0] - from[0], to[1] - from[1]);
  // unit normal, for the ends
  const nx = ((from[1] - to[1]) / length) * 4;
  const ny = ((to[0] - from[0]) / length) * 4;
  const end = ([x, y]: Point) => `M${x - nx} ${y - ny}L${x + nx} ${y + ny}`;
  return (
    <path
      d={`M${from[0]} ${from[1]}L${to[0]} ${to[1]}${end(from)}${end(to)}`}
      className="stroke-soft"
      strokeWidth="1.2"
    />
  );
}

/** A line that is thought, not seen. */
export function Sight({ d }: { d: string }) {
  return <path d={d} className="stroke-edge" strokeWidth="1.2" strokeDasharray="3 4" />;
}

/** A view's name, where one drawing holds two. */
export function ViewName({ x, children }: { x: number; children: ReactNode }) {
  return (
    <Words at={[x, 18]} anchor="middle">
      {children}
    </Words>
  );
}

import type { ChangeRow } from '#shared/reading/changes.ts';

/** Degrees or millimetres from zero to an end of the bar. */
const REACH = { degrees: 10, millimetres: 20 } as const;

/** A change against zero: grey what cannot be told from none; filled and long where it can. */
export function ChangeBar({ row }: { row: ChangeRow }) {
  const reach = REACH[row.unit];
  const x = (value: number) => `${50 + 48 * Math.min(1, Math.max(-1, value / reach))}%`;
  if (row.change === null) return null;
  return (
    <svg width="100%" height="24" aria-hidden="true" className="block">
      {row.smallest !== null && (
        <rect
          x={x(-row.smallest)}
          width={`${96 * Math.min(1, row.smallest / reach)}%`}
          y="6"
          height="12"
          className="fill-rule/70"
        />
      )}
      <line x1="50%" x2="50%" y1="3" y2="21" className="stroke-edge" />
      <line
        x1="50%"
        x2={x(row.change)}
        y1="12"
        y2="12"
        strokeWidth={row.beyond ? 2.5 : 1.5}
        className={row.beyond ? 'stroke-ink' : 'stroke-edge'}
      />
      <circle
        cx={x(row.change)}
        cy="12"
        r="4.5"
        strokeWidth="1.75"
        className={row.beyond ? 'fill-ink stroke-ink' : 'fill-mud stroke-soft'}
      />
    </svg>
  );
}

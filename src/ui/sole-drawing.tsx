/** The support foot from above, drawn as the right one: its three points bear alike. */
export function SoleDrawing({ mirrored }: { mirrored: boolean }) {
  const x = (own: number) => (mirrored ? 160 - own : own);
  const anchor = (own: 'start' | 'end') => (mirrored ? (own === 'start' ? 'end' : 'start') : own);
  return (
    <>
      <path
        transform={mirrored ? 'translate(160 0) scale(-1 1)' : undefined}
        d="M66 44C58 46 57 62 59 76C61 94 66 104 65 124C64 146 64 176 80 178C96 177 95 148 98 124C101 100 106 92 104 76C102 64 98 58 92 54C88 50 84 50 82 48C78 40 72 42 66 44Z"
        className="fill-shank-pale stroke-shank"
      />
      {[
        [70, 80],
        [95, 88],
        [80, 164],
      ].map(([cx = 0, cy]) => (
        <g key={cy} className="stroke-shank">
          <circle cx={x(cx)} cy={cy} r="6" className="fill-sheet" strokeWidth="2" />
          <circle cx={x(cx)} cy={cy} r="2" stroke="none" className="fill-shank" />
        </g>
      ))}
      <g stroke="none" className="fill-soft text-[12px]">
        <text x={x(54)} y="84" textAnchor={anchor('end')}>
          big toe
        </text>
        <text x={x(108)} y="92" textAnchor={anchor('start')}>
          little toe
        </text>
        <text x={x(102)} y="168" textAnchor={anchor('start')}>
          heel
        </text>
      </g>
    </>
  );
}

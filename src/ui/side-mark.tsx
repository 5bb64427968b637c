/**
 * The shapes that double the colours: support side = ring with a dot, lifted side = diamond, trunk and
 * pelvis midline = square bracket. Vermilion and teal mean sides and nothing else.
 */
export type SideMarkKind = 'support' | 'lifted' | 'midline';

const COLOURS = {
  paper: { support: 'text-shank', lifted: 'text-tide', midline: 'text-ink' },
  dusk: { support: 'text-shank-dusk', lifted: 'text-tide-dusk', midline: 'text-dusk-ink' },
} as const;

export function SideMark({
  kind,
  on = 'paper',
  size = 16,
  title,
}: {
  kind: SideMarkKind;
  on?: keyof typeof COLOURS;
  /** Pixels. */
  size?: number;
  /** Left out where words beside it say the same. */
  title?: string;
}) {
  return (
    <svg
      width={size}
      height={size}
      viewBox="-8 -8 16 16"
      fill="none"
      stroke="currentColor"
      strokeWidth="2"
      className={`inline-block flex-none align-[-3px] ${COLOURS[on][kind]}`}
      role={title === undefined ? undefined : 'img'}
      aria-label={title}
      aria-hidden={title === undefined || undefined}
    >
      {kind === 'support' && <circle r="6" />}
      {kind === 'lifted' && <path d="M0-6.8 6.8 0 0 6.8-6.8 0z" strokeLinejoin="round" />}
      {kind === 'midline' && <path d="M-2-6h-4V6h4M2-6h4V6H2" />}
      <circle r="1.6" fill="currentColor" stroke="none" />
    </svg>
  );
}

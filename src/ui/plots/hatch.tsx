/** Fine slanted lines: they tell an area from its neighbour where two pale fills would not. */
export function Hatch({
  id,
  className,
  gap = 6,
}: {
  id: string;
  /** Gives the lines their colour. */
  className: string;
  gap?: number;
}) {
  return (
    <pattern
      id={id}
      width={gap}
      height={gap}
      patternUnits="userSpaceOnUse"
      patternTransform="rotate(45)"
    >
      <path d={`M0 0V${gap}`} strokeWidth="1.5" className={className} />
    </pattern>
  );
}

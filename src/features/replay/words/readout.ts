/** What the line under the picture says of the frame on show; empty where it is not known. */
export const liftReadout = (lift: number | null, fromFront: boolean): string => {
  if (lift === null) return '';
  return fromFront && lift < 20 ? 'under 20°' : `${Math.round(lift)}°`;
};

/** Turn of the hip stood on, degrees, out positive: `11° out`, `3° in`, `0°`. */
export const turnReadout = (turn: number | null): string => {
  if (turn === null) return '';
  const size = Math.round(Math.abs(turn));
  if (size === 0) return '0°';
  return `${size}° ${turn > 0 ? 'out' : 'in'}`;
};

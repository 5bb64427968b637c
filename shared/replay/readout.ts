import { plusMinus } from '#shared/exports/figures.ts';

/** An angle of the frame on show and its ±, degrees. */
interface Angles {
  readonly lift: number | null;
  readonly liftPlusMinus: number | null;
  readonly turn: number | null;
  readonly turnPlusMinus: number | null;
}

/** A ± of whole degrees, rounded up so that it never claims more than is known. */
const within = (value: number | null): string =>
  value === null ? '' : ` ${plusMinus(Math.ceil(value), 0)}°`;

/** What the line under the picture says of the frame on show; empty where it is not known. */
export const liftReadout = (
  { lift, liftPlusMinus }: Pick<Angles, 'lift' | 'liftPlusMinus'>,
  fromFront: boolean,
): string => {
  if (lift === null) return '';
  return fromFront && lift < 20 ? 'under 20°' : `${Math.round(lift)}°${within(liftPlusMinus)}`;
};

/** Turn of the hip stood on, degrees, out positive: `11° out ± 5°`, `3° in ± 4°`, `0° ± 5°`. */
export const turnReadout = ({
  turn,
  turnPlusMinus,
}: Pick<Angles, 'turn' | 'turnPlusMinus'>): string => {
  if (turn === null) return '';
  const size = Math.round(Math.abs(turn));
  const way = size === 0 ? '' : turn > 0 ? ' out' : ' in';
  return `${size}°${way}${within(turnPlusMinus)}`;
};

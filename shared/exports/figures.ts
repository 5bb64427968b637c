/** How numbers are written everywhere: a true minus, one decimal for angles, a sign on turn. */
const MINUS = '−';

/** `1.5`, `−1.5`; 0 never carries a minus. */
export function decimal(value: number, digits = 1): string {
  const text = value.toFixed(digits);
  return Number(text) === 0 ? (0).toFixed(digits) : text.replace('-', MINUS);
}

/** An angle without a sign of its own direction, degrees: `62.0°`. */
export const degrees = (value: number, digits = 1): string => `${decimal(value, digits)}°`;

/** A turn, degrees, external positive: `+6.8°`, `−1.2°`, `0.0°`. */
export function turn(value: number, digits = 1): string {
  const text = degrees(value, digits);
  return Number(value.toFixed(digits)) > 0 ? `+${text}` : text;
}

/** What stands behind a value: `± 3.6`, never broken over two lines. */
export const plusMinus = (value: number, digits = 1): string => `±\u00a0${decimal(value, digits)}`;

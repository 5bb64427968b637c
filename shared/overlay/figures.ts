import type { Degrees } from '#shared/geometry/units.ts';

const MINUS = '\u2212';

/** `+6.7°`, `−0.4°`: a sign on every turn, a true minus, one decimal. */
export const signedDegrees = (angle: Degrees, decimals = 1): string => {
  const text = Math.abs(angle).toFixed(decimals);
  const zero = Number(text) === 0;
  return `${zero ? '' : angle < 0 ? MINUS : '+'}${text}°`;
};

/** `74.2°`; under 0 with a true minus. */
export const plainDegrees = (angle: Degrees, decimals = 1): string => {
  const text = Math.abs(angle).toFixed(decimals);
  return `${angle < 0 && Number(text) !== 0 ? MINUS : ''}${text}°`;
};

/** `± 5.1`, never signed. */
export const plusMinus = (halfWidth: Degrees, decimals = 1): string =>
  `± ${Math.abs(halfWidth).toFixed(decimals)}`;

/** Below this a lift from the front is shown as '< 20°': the cosine is blind there. */
export const LEAST_SHOWN_LIFT = 20;
export const liftText = (lift: Degrees, fromFront: boolean, decimals = 1): string =>
  fromFront && lift < LEAST_SHOWN_LIFT ? `< ${LEAST_SHOWN_LIFT}°` : plainDegrees(lift, decimals);

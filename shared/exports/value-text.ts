import type { FrameValue } from '#shared/measures/frame-values.ts';
import type { Measure } from '#shared/measures/measure.ts';
import { LEAST_SHOWN_LIFT } from '#shared/overlay/figures.ts';
import { decimal, degrees, plusMinus, turn } from './figures.ts';

/** Values that carry a sign of their own direction; lift does not. */
const UNSIGNED: ReadonlySet<string> = new Set(['lift', 'thigh-against-trunk']);

export const valueText = ({ id, unit }: Measure, value: number, fromFront: boolean): string => {
  if (unit === 'millimetres') return `${value > 0 ? '+' : ''}${decimal(value, 0)} mm`;
  if (id === 'lift' && fromFront && value < LEAST_SHOWN_LIFT) return `< ${LEAST_SHOWN_LIFT}°`;
  return UNSIGNED.has(id) ? degrees(value) : turn(value);
};

export const halfWidthText = (
  { measure, value }: FrameValue,
  fromFront: boolean,
): string | null => {
  if (value.halfWidth === null) return null;
  const blind = measure.id === 'lift' && fromFront && value.value < LEAST_SHOWN_LIFT;
  return blind ? null : plusMinus(value.halfWidth, measure.unit === 'millimetres' ? 0 : 1);
};

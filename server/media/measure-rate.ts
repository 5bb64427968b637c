import { type FrameRate, frameRate } from '#shared/timing/frame-rate.ts';
import { rational } from './rational.ts';
import type { MeasuredRate, Rational } from './types.ts';

/** Rates that recorders aim at; 1000/1001 of each as well (SMPTE ST 12-1). */
const usual = [24, 25, 30, 48, 50, 60, 90, 100, 120, 200, 240, 480];

/**
 * Frames per second from the instants alone. Constant where one rate puts every frame within one
 * tick of where it stands, which allows for rounding to the file's clock and for nothing else.
 *
 * @param ticks at least two, strictly ascending
 */
export function measureRate(ticks: readonly number[], timeBase: Rational): MeasuredRate {
  const first = ticks[0];
  const last = ticks.at(-1);
  if (first === undefined || last === undefined || last <= first)
    throw new RangeError('A frame rate needs two instants.');
  const mean = rational(
    BigInt(ticks.length - 1) * BigInt(timeBase.den),
    BigInt(last - first) * BigInt(timeBase.num),
  );
  const perSecond = mean.num / mean.den;
  const candidates = usual
    .flatMap((rate) => [frameRate(rate, 1), frameRate(rate * 1000, 1001)])
    .filter((rate): rate is FrameRate => rate !== null)
    .concat(frameRate(mean.num, mean.den) ?? []);
  const rate = candidates.find(
    ({ numerator, denominator }) =>
      Math.abs(numerator / denominator / perSecond - 1) < 0.02 &&
      fits(ticks, (timeBase.den * denominator) / (timeBase.num * numerator)),
  );
  return rate ? { kind: 'constant', rate } : variable(ticks, timeBase);
}

/** @param interval ticks per frame, a fraction */
function fits(ticks: readonly number[], interval: number): boolean {
  let low = Infinity;
  let high = -Infinity;
  for (const [frame, tick] of ticks.entries()) {
    const off = tick - (ticks[0] ?? 0) - frame * interval;
    low = Math.min(low, off);
    high = Math.max(high, off);
  }
  // rounding to whole ticks moves a frame by half a tick each way
  return high - low <= 1 + 1e-6;
}

function variable(ticks: readonly number[], timeBase: Rational): MeasuredRate {
  const gaps = ticks.slice(1).map((tick, i) => tick - (ticks[i] ?? tick));
  gaps.sort((a, b) => a - b);
  const rateOf = (gap: number) => timeBase.den / (gap * timeBase.num);
  const middle = gaps.length >> 1;
  const median =
    gaps.length % 2 === 1
      ? (gaps[middle] ?? NaN)
      : ((gaps[middle - 1] ?? NaN) + (gaps[middle] ?? NaN)) / 2;
  return {
    kind: 'variable',
    min: rateOf(gaps.at(-1) ?? NaN),
    median: rateOf(median),
    max: rateOf(gaps[0] ?? NaN),
  };
}

/** The one figure to show: the rate, or the median where it varies. */
export const typicalRate = (rate: MeasuredRate): number =>
  rate.kind === 'constant' ? rate.rate.numerator / rate.rate.denominator : rate.median;

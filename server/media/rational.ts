import { type Seconds, seconds } from '#shared/timing/units.ts';
import type { Rational, Timestamp } from './types.ts';

const gcd = (a: bigint, b: bigint): bigint => (b === 0n ? a : gcd(b, a % b));

/** Lowest terms with a positive denominator; throws RangeError for a denominator of 0. */
export function rational(num: number | bigint, den: number | bigint): Rational {
  if (BigInt(den) === 0n) throw new RangeError('A fraction needs a denominator other than 0.');
  const sign = BigInt(den) < 0n ? -1n : 1n;
  const [n, d] = [BigInt(num) * sign, BigInt(den) * sign];
  const common = gcd(n < 0n ? -n : n, d);
  return { num: Number(n / common), den: Number(d / common) };
}

/** Reads '1/15360' or '4:3' as ffprobe writes them; null for 0/0, 0:1 and anything that is not a positive fraction. */
export function parseRational(text: string | undefined): Rational | null {
  const match = /^(\d+)[/:](\d+)$/.exec(text ?? '');
  if (!match?.[1] || !match[2]) return null;
  const [num, den] = [BigInt(match[1]), BigInt(match[2])];
  return num > 0n && den > 0n ? rational(num, den) : null;
}

/** a ÷ b, exact. */
export const divide = (a: Rational, b: Rational): Rational =>
  rational(BigInt(a.num) * BigInt(b.den), BigInt(a.den) * BigInt(b.num));

/** Whole microseconds, halves away from zero; exact where a product of numbers would overflow. */
export function microseconds(ticks: number, timeBase: Rational): number {
  const scaled = BigInt(ticks) * BigInt(timeBase.num) * 1_000_000n;
  const den = BigInt(timeBase.den);
  const half = scaled < 0n ? -den : den;
  return Number((2n * scaled + half) / (2n * den));
}

export const secondsOf = ({ ticks, timeBase }: Timestamp): Seconds =>
  seconds((ticks * timeBase.num) / timeBase.den);

/** First tick at or after a time. */
export const tickAtOrAfter = (time: Seconds, timeBase: Rational): number =>
  Math.ceil((time * timeBase.den) / timeBase.num - 1e-9);

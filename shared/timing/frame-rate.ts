import { seconds, type Seconds } from './units.ts';

/** Frames per second as a fraction of whole numbers: 30000/1001 stays exact. */
export interface FrameRate {
  readonly numerator: number;
  readonly denominator: number;
}

/** Null where the fraction is not a positive one: an unknown rate is unknown, never 0. */
export const frameRate = (numerator: number, denominator: number): FrameRate | null =>
  Number.isSafeInteger(numerator) &&
  Number.isSafeInteger(denominator) &&
  numerator > 0 &&
  denominator > 0
    ? { numerator, denominator }
    : null;

/** Reads '30000/1001' or '60' as media probes write them; null for '0/0' and anything else. */
export const parseFrameRate = (text: string): FrameRate | null => {
  const match = /^(\d+)(?:\/(\d+))?$/.exec(text.trim());
  return match ? frameRate(Number(match[1]), Number(match[2] ?? '1')) : null;
};

export const framesPerSecond = (rate: FrameRate): number => rate.numerator / rate.denominator;

/** Time of one frame at this rate. */
export const frameDuration = (rate: FrameRate): Seconds =>
  seconds(rate.denominator / rate.numerator);

declare const unit: unique symbol;
type Unit<U extends string> = number & { readonly [unit]: U };

/** Whole number of a frame in its clip, from 0, in the order of the timestamps. */
export type FrameIndex = Unit<'frame'>;
export type Seconds = Unit<'seconds'>;
export type Milliseconds = Unit<'milliseconds'>;

export const frameIndex = (value: number): FrameIndex => {
  if (!Number.isInteger(value) || value < 0)
    throw new RangeError(`A frame index is a whole number from 0, not ${value}.`);
  return value as FrameIndex;
};
export const seconds = (value: number): Seconds => value as Seconds;
export const milliseconds = (value: number): Milliseconds => value as Milliseconds;

export const toSeconds = (time: Milliseconds): Seconds => seconds(time / 1000);
export const toMilliseconds = (time: Seconds): Milliseconds => milliseconds(time * 1000);

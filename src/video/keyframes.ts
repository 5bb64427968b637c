import type { FrameIndex } from '#shared/timing/units.ts';

/** Which packets to hand to the decoder, first and last inclusive. */
export interface DecodePlan {
  readonly from: FrameIndex;
  readonly to: FrameIndex;
}

/** The last key frame at or before `index`; `keys` rises and begins with frame 0. */
export const keyAtOrBefore = (keys: readonly FrameIndex[], index: FrameIndex): FrameIndex => {
  let low = 0;
  let high = keys.length - 1;
  while (low < high) {
    const middle = (low + high + 1) >> 1;
    if ((keys[middle] ?? Infinity) <= index) low = middle;
    else high = middle - 1;
  }
  const key = keys[low];
  if (key === undefined || key > index)
    throw new RangeError(`No key frame at or before frame ${index}.`);
  return key;
};

/**
 * The shortest run of packets that brings `want` out of the decoder. `fed` is the last packet it
 * was given without a gap since, null where its next packet must be a key frame.
 */
export const planDecode = (
  keys: readonly FrameIndex[],
  want: FrameIndex,
  fed: FrameIndex | null,
): DecodePlan => {
  const key = keyAtOrBefore(keys, want);
  const carriesOn = fed !== null && fed < want && fed >= key;
  return { from: carriesOn ? ((fed + 1) as FrameIndex) : key, to: want };
};

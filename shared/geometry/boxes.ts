/** A box in pixels of the upright source frame, as points are. */
export interface Box {
  readonly left: number;
  readonly top: number;
  readonly width: number;
  readonly height: number;
}

/** Larger by so many pixels on every side. */
export const grown = ({ left, top, width, height }: Box, by: number): Box => ({
  left: left - by,
  top: top - by,
  width: width + 2 * by,
  height: height + 2 * by,
});

/** The smallest box around both. */
export const boxAround = (a: Box, b: Box): Box => {
  const left = Math.min(a.left, b.left);
  const top = Math.min(a.top, b.top);
  return {
    left,
    top,
    width: Math.max(a.left + a.width, b.left + b.width) - left,
    height: Math.max(a.top + a.height, b.top + b.height) - top,
  };
};

/** The part of a box within a picture of this size; null where that is nothing. */
export const boxWithin = (
  box: Box,
  picture: { readonly width: number; readonly height: number },
): Box | null => {
  const left = Math.max(0, box.left);
  const top = Math.max(0, box.top);
  const right = Math.min(picture.width, box.left + box.width);
  const bottom = Math.min(picture.height, box.top + box.height);
  if (!(right > left && bottom > top)) return null;
  return { left, top, width: right - left, height: bottom - top };
};

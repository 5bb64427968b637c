import type { Crop } from '../player/crop.ts';

/** Height over width of either picture when two stand beside each other on a phone. */
const TALL = 1.55;

/** The same part of the picture in the shape that both have: widened or heightened about its middle, else cut. */
export const besideCrop = (
  crop: Crop,
  whole: { readonly width: number; readonly height: number },
): Crop => {
  const wide = crop.height > crop.width * TALL;
  let width = wide ? Math.min(whole.width, crop.height / TALL) : crop.width;
  let height = wide ? crop.height : Math.min(whole.height, crop.width * TALL);
  if (height > width * TALL) height = width * TALL;
  else width = height / TALL;
  const place = (from: number, had: number, has: number, most: number) =>
    Math.min(Math.max(0, from + (had - has) / 2), most - has);
  return {
    u: place(crop.u, crop.width, width, whole.width),
    v: place(crop.v, crop.height, height, whole.height),
    width,
    height,
  };
};

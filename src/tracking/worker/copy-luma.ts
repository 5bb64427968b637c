import { type Plane, planeOf } from '../core/plane.ts';

/** Formats whose first plane is luma, a byte per pixel. */
const LUMA_FIRST: readonly (VideoPixelFormat | null)[] = ['I420', 'I420A', 'I422', 'I444', 'NV12'];

/** Luma of RGBA pixels by the weights of Rec. 601, in eighths of a byte. */
export const lumaOf = (rgba: Uint8Array | Uint8ClampedArray): Uint8Array<ArrayBuffer> => {
  const luma = new Uint8Array(rgba.length / 4);
  for (let k = 0, at = 0; k < luma.length; k += 1, at += 4)
    luma[k] =
      (77 * (rgba[at] as number) +
        150 * (rgba[at + 1] as number) +
        29 * (rgba[at + 2] as number)) >>
      8;
  return luma;
};

/** The grey values of a decoded frame; does not close it. */
export const copyLuma = async (frame: VideoFrame): Promise<Plane> => {
  const width = frame.visibleRect?.width ?? frame.codedWidth;
  const height = frame.visibleRect?.height ?? frame.codedHeight;
  if (LUMA_FIRST.includes(frame.format)) {
    const data = new Uint8Array(frame.allocationSize());
    const [luma] = await frame.copyTo(data);
    const { offset = 0, stride = width } = luma ?? {};
    return planeOf(data.subarray(offset, offset + stride * height), width, height, stride);
  }
  // it lives on a graphics card, or is of a kind that screens have
  const rgba = new Uint8Array(frame.allocationSize({ format: 'RGBA' }));
  await frame.copyTo(rgba, { format: 'RGBA' });
  return planeOf(lumaOf(rgba), width, height);
};

import type { PaintMethod } from './pixel-picture.ts';
import type { Picture } from './types.ts';

const ROUNDS = 3;

/**
 * Time to paint and have the pixels, ms: reading one back waits for a graphics card to finish. Each time on a new
 * canvas, because a browser takes one that is read twice away from the graphics card, and warns.
 */
const timeOnce = async (picture: Picture): Promise<number> => {
  const canvas = document.createElement('canvas');
  canvas.width = picture.width;
  canvas.height = picture.height;
  const context = canvas.getContext('2d', { alpha: false });
  if (!context) return Infinity;
  const start = performance.now();
  await picture.paint(context, () => true);
  context.getImageData(0, 0, 1, 1);
  return performance.now() - start;
};

/**
 * The faster way to paint on this machine: converting in memory takes about 1 ms at 720p where
 * drawing takes 13 without a graphics card, and it may be the reverse with one. Measured with a
 * real picture on a canvas nobody sees, by turns, so that other work on the machine slows both.
 * `setMethod` switches the picture's method.
 */
export const measurePaintMethod = async (
  picture: Picture,
  setMethod: (method: PaintMethod) => void,
): Promise<PaintMethod> => {
  const best: Record<PaintMethod, number> = { draw: Infinity, convert: Infinity };
  for (let round = 0; round < ROUNDS; round += 1) {
    for (const method of ['draw', 'convert'] as const) {
      setMethod(method);
      const time = await timeOnce(picture).catch(() => Infinity);
      best[method] = Math.min(best[method], time);
    }
  }
  const method = best.convert < best.draw ? 'convert' : 'draw';
  setMethod(method);
  return method;
};

import type { FrameIndex } from '#shared/timing/units.ts';
import type { Picture } from './types.ts';

export interface CanvasPainter {
  /**
   * Paints the picture, sizing the canvas to it. True once its pixels are on the canvas, false
   * where a later `show` or `clear` overtook it, so that an older frame never covers a newer one.
   */
  show(picture: Picture): Promise<boolean>;
  /** The frame whose pixels are on the canvas, null before the first. */
  shown(): FrameIndex | null;
  clear(): void;
}

/** One painter per canvas. Throws where the canvas already has a context of another kind. */
export const createCanvasPainter = (canvas: HTMLCanvasElement): CanvasPainter => {
  const context = canvas.getContext('2d', { alpha: false });
  if (!context) throw new TypeError('The canvas has no 2d context.');
  let latest = 0;
  let shown: FrameIndex | null = null;
  return {
    async show(picture) {
      const turn = (latest += 1);
      const painted = await picture.paint(context, () => {
        if (turn !== latest) return false;
        // setting the size wipes the canvas: only where it differs, and only just before painting
        if (canvas.width !== picture.width) canvas.width = picture.width;
        if (canvas.height !== picture.height) canvas.height = picture.height;
        return true;
      });
      if (painted) shown = picture.index;
      return painted;
    },
    shown: () => shown,
    clear() {
      latest += 1;
      shown = null;
      context.clearRect(0, 0, canvas.width, canvas.height);
    },
  };
};

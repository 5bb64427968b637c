import type { FrameIndex } from '#shared/timing/units.ts';
import type { Primitive } from '#shared/overlay/types.ts';
import { paintOverlay } from '#shared/overlay/paint-overlay.ts';
import type { Size, Viewport } from '#src/canvas/viewport.ts';
import { type CanvasPainter, createCanvasPainter } from '#src/video/canvas-painter.ts';
import type { FrameSource } from '#src/video/types.ts';

/** A small picture to be made of one frame. */
export interface ThumbOrder {
  readonly frame: FrameIndex;
  readonly canvas: HTMLCanvasElement;
  readonly viewport: Viewport;
  readonly drawn: readonly Primitive[];
  /** Called once it is painted, or cannot be. */
  readonly painted?: () => void;
}

export interface ThumbPainter {
  /** Paints when nobody steps; the answer takes the order back. */
  readonly order: (order: ThumbOrder) => () => void;
  /** Somebody steps through the clip: wait. */
  readonly hold: () => void;
  readonly close: () => void;
}

/** Nobody has stepped for this long, ms: then small pictures may take their turn. */
const CALM_MS = 250;

/** One frame at a time, in the order asked for. The frames come from the Bench's own pictures. */
export const createThumbPainter = (source: FrameSource, frameSize: Size): ThumbPainter => {
  const orders = new Set<ThumbOrder>();
  let held = 0;
  let timer: ReturnType<typeof setTimeout> | undefined;
  let running = false;
  let closed = false;
  const board = document.createElement('canvas');
  let painter: CanvasPainter | null = null;

  const paint = async ({ frame, canvas, viewport, drawn }: ThumbOrder): Promise<void> => {
    const picture = await source.frame(frame, { intent: 'scrub' });
    painter ??= createCanvasPainter(board);
    if (!(await painter.show(picture)) || closed) return;
    const context = canvas.getContext('2d');
    if (!context) return;
    const { width, height } = canvas;
    context.imageSmoothingQuality = 'high';
    const shown = {
      width: viewport.scale * frameSize.width,
      height: viewport.scale * frameSize.height,
    };
    context.fillStyle = '#1b211f';
    context.fillRect(0, 0, width, height);
    context.drawImage(board, viewport.x, viewport.y, shown.width, shown.height);
    paintOverlay(context, drawn, { viewport, bounds: { width, height } });
    canvas.dataset.painted = String(frame);
  };

  const run = async (): Promise<void> => {
    if (running) return;
    running = true;
    while (!closed) {
      const calm = held - performance.now();
      if (calm > 0) {
        await new Promise((resolve) => (timer = setTimeout(resolve, calm)));
        continue;
      }
      const [next] = orders;
      if (!next) break;
      orders.delete(next);
      // a frame that cannot be shown leaves its small picture dark; the clip itself says why
      await paint(next).catch(() => undefined);
      if (!closed) next.painted?.();
    }
    running = false;
  };

  return {
    order(order) {
      orders.add(order);
      void run();
      return () => void orders.delete(order);
    },
    hold() {
      held = performance.now() + CALM_MS;
    },
    close() {
      closed = true;
      clearTimeout(timer);
      orders.clear();
    },
  };
};

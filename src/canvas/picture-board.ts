import { longEdgeOf, type Size, type Viewport } from './viewport.ts';

/**
 * The pictures of the frame that is shown: the prepared copy's canvas, and the phone's own picture
 * once it has arrived. Stage and magnifier paint from the same board.
 */
export interface PictureBoard {
  readonly copy: () => HTMLCanvasElement | null;
  readonly full: () => HTMLImageElement | null;
  readonly attach: (canvas: HTMLCanvasElement | null) => void;
  readonly setFull: (image: HTMLImageElement | null) => void;
  /** New pixels are on the copy's canvas. */
  readonly painted: () => void;
  readonly subscribe: (listener: () => void) => () => void;
}

export const createPictureBoard = (): PictureBoard => {
  let canvas: HTMLCanvasElement | null = null;
  let image: HTMLImageElement | null = null;
  const listeners = new Set<() => void>();
  const tell = () => {
    for (const listener of listeners) listener();
  };
  return {
    copy: () => canvas,
    full: () => image,
    attach(next) {
      canvas = next;
      tell();
    },
    setFull(next) {
      image = next;
      tell();
    },
    painted: tell,
    subscribe(listener) {
      listeners.add(listener);
      return () => void listeners.delete(listener);
    },
  };
};

/** Paints the best picture there is under a viewport; nothing where none has arrived. */
export const paintPicture = (
  context: CanvasRenderingContext2D,
  board: PictureBoard,
  frame: Size,
  viewport: Viewport,
): void => {
  const source = board.full() ?? board.copy();
  if (!source || source.width === 0) return;
  context.imageSmoothingEnabled = true;
  context.imageSmoothingQuality = 'high';
  context.drawImage(
    source,
    viewport.x,
    viewport.y,
    viewport.scale * frame.width,
    viewport.scale * frame.height,
  );
};

/** Long edge, px, of the picture that the hand sees: a coarser one costs certainty. */
export const pictureLongEdge = (board: PictureBoard, frame: Size, copy: Size): number =>
  longEdgeOf(board.full() ? frame : copy);

import { useEffect, useRef } from 'react';
import type { PictureBoard } from './picture-board.ts';
import type { Size, Viewport } from './viewport.ts';

/**
 * The clip's picture on a plain canvas, moved and enlarged by the viewport alone: its pixels are
 * painted once per frame by whoever decodes them. Over it, once asked for and arrived, the frame
 * at the phone's own resolution.
 */
export function PictureLayer({
  board,
  frame,
  copy,
  viewport,
  fullFrameUrl,
}: {
  board: PictureBoard;
  frame: Size;
  copy: Size;
  viewport: Viewport;
  /** Null while the copy is sharp enough. */
  fullFrameUrl: string | null;
}) {
  const canvas = useRef<HTMLCanvasElement>(null);
  useEffect(() => {
    board.attach(canvas.current);
    return () => board.attach(null);
  }, [board]);
  const { scale, x, y } = viewport;
  return (
    <>
      <canvas
        ref={canvas}
        aria-hidden="true"
        data-picture="copy"
        className="absolute left-0 top-0 block max-w-none origin-top-left"
        style={{
          width: copy.width,
          height: copy.height,
          transform: `translate(${x}px, ${y}px) scale(${(scale * frame.width) / copy.width})`,
        }}
      />
      {fullFrameUrl !== null && (
        <FullFrame key={fullFrameUrl} {...{ board, frame, viewport }} url={fullFrameUrl} />
      )}
    </>
  );
}

function FullFrame({
  board,
  frame,
  viewport,
  url,
}: {
  board: PictureBoard;
  frame: Size;
  viewport: Viewport;
  url: string;
}) {
  // the board forgets the picture together with the frame it belongs to
  useEffect(() => () => board.setFull(null), [board]);
  return (
    <img
      src={url}
      alt=""
      data-picture="full"
      className="absolute left-0 top-0 block max-w-none origin-top-left"
      onLoad={(event) => board.setFull(event.currentTarget)}
      style={{
        width: frame.width,
        height: frame.height,
        transform: `translate(${viewport.x}px, ${viewport.y}px) scale(${viewport.scale})`,
      }}
    />
  );
}

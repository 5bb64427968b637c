import { useEffect, useRef } from 'react';
import type { FramePoint } from '#shared/geometry/points.ts';
import type { Primitive } from '#shared/overlay/types.ts';
import { type Hand, lookedAt } from './hand.ts';
import type { Moved } from './konva-layer.tsx';
import { paintOverlay } from '#shared/overlay/paint-overlay.ts';
import { paintPicture, type PictureBoard } from './picture-board.ts';
import type { Size, Viewport } from './viewport.ts';

export interface MagnifierProps {
  board: PictureBoard;
  frame: Size;
  /** CSS px. */
  width: number;
  height: number;
  /** CSS px per source px. */
  enlarge: number;
  hand: Hand;
  /** Looked at while the hand is nowhere; null shows nothing then. */
  resting: FramePoint | null;
  draw: (moved: Moved) => readonly Primitive[];
  /** Lines of the cross leave this much free about the exact point, CSS px. */
  cross?: boolean;
  className?: string;
}

const FREE = 9;

const paintCross = (context: CanvasRenderingContext2D, width: number, height: number) => {
  const x = width / 2;
  const y = height / 2;
  context.beginPath();
  for (const [fromX, fromY, toX, toY] of [
    [0, y, x - FREE, y],
    [x + FREE, y, width, y],
    [x, 0, x, y - FREE],
    [x, y + FREE, x, height],
  ] as const) {
    context.moveTo(fromX, fromY);
    context.lineTo(toX, toY);
  }
  context.setLineDash([]);
  context.strokeStyle = 'rgba(18, 23, 21, 0.6)';
  context.lineWidth = 3;
  context.stroke();
  context.strokeStyle = 'rgba(255, 255, 255, 0.85)';
  context.lineWidth = 1.25;
  context.stroke();
  context.fillStyle = '#fff';
  context.fillRect(x - 0.75, y - 0.75, 1.5, 1.5);
};

/** A glass over the exact place: the best picture there is, the marks, and a cross. */
export function Magnifier(props: MagnifierProps) {
  const { width, height, board, hand, className } = props;
  const canvas = useRef<HTMLCanvasElement>(null);
  useEffect(() => {
    let asked = 0;
    const paint = () => {
      asked = 0;
      if (canvas.current) paintGlass(canvas.current, props);
    };
    const ask = () => {
      if (asked === 0) asked = requestAnimationFrame(paint);
    };
    ask();
    const stops = [hand.subscribe(ask), board.subscribe(ask)];
    return () => {
      cancelAnimationFrame(asked);
      for (const stop of stops) stop();
    };
  });
  return (
    <canvas
      ref={canvas}
      aria-hidden="true"
      className={className}
      style={{ width, height }}
      data-magnifier=""
    />
  );
}

const paintGlass = (canvas: HTMLCanvasElement, props: MagnifierProps) => {
  const { width, height, enlarge, hand, resting, board, frame, draw, cross = true } = props;
  const context = canvas.getContext('2d');
  if (!context) return;
  const ratio = window.devicePixelRatio;
  canvas.width = Math.round(width * ratio);
  canvas.height = Math.round(height * ratio);
  context.setTransform(ratio, 0, 0, ratio, 0, 0);
  context.fillStyle = '#121715';
  context.fillRect(0, 0, width, height);
  const centre = lookedAt(hand.get()) ?? resting;
  if (!centre) return;
  const viewport: Viewport = {
    scale: enlarge,
    x: width / 2 - enlarge * centre.u,
    y: height / 2 - enlarge * centre.v,
  };
  paintPicture(context, board, frame, viewport);
  const shown = draw(hand.get().moved).filter(
    (each) => each.kind !== 'label' && each.state !== 'next',
  );
  paintOverlay(context, shown, { viewport, bounds: { width, height } });
  if (cross) paintCross(context, width, height);
};

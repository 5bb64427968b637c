import type { StagePoint } from '#shared/geometry/points.ts';
import {
  OVERLAY_COLOURS,
  OVERLAY_DASHES,
  OVERLAY_HALO,
  OVERLAY_NEXT,
  OVERLAY_SIZES,
} from '#shared/overlay/style.ts';
import type { MarkShape } from '#shared/overlay/types.ts';

/** The part of a 2D context that painting needs; the same on a page, in a worker and on a server. */
export type PaintContext = Pick<
  CanvasRenderingContext2D,
  | 'save'
  | 'restore'
  | 'translate'
  | 'beginPath'
  | 'moveTo'
  | 'lineTo'
  | 'arc'
  | 'rect'
  | 'closePath'
  | 'stroke'
  | 'fill'
  | 'fillText'
  | 'strokeText'
  | 'measureText'
  | 'setLineDash'
  | 'strokeStyle'
  | 'fillStyle'
  | 'lineWidth'
  | 'lineCap'
  | 'lineJoin'
  | 'font'
  | 'textAlign'
  | 'textBaseline'
>;

/** Strokes the current path twice: a dark edge first, then the colour, at constant width. */
export const strokeWithHalo = (
  context: PaintContext,
  colour: string,
  width: number,
  unit: number,
): void => {
  context.strokeStyle = OVERLAY_HALO;
  context.lineWidth = (width + 2 * OVERLAY_SIZES.halo) * unit;
  context.stroke();
  context.strokeStyle = colour;
  context.lineWidth = width * unit;
  context.stroke();
};

const outline = (context: PaintContext, shape: MarkShape, grow: number): void => {
  context.beginPath();
  if (shape.kind === 'ring') {
    context.arc(0, 0, OVERLAY_SIZES.ringRadius * grow, 0, 2 * Math.PI);
  } else if (shape.kind === 'diamond') {
    const half = OVERLAY_SIZES.diamondHalf * grow;
    context.moveTo(0, -half);
    context.lineTo(half, 0);
    context.lineTo(0, half);
    context.lineTo(-half, 0);
    context.closePath();
  } else {
    const half = OVERLAY_SIZES.bracketHalf * grow;
    const lip = OVERLAY_SIZES.bracketLip * grow;
    for (const side of [-1, 1]) {
      context.moveTo(side * (half - lip), -half);
      context.lineTo(side * half, -half);
      context.lineTo(side * half, half);
      context.lineTo(side * (half - lip), half);
    }
  }
};

const scaled = (dash: readonly number[], unit: number): number[] =>
  dash.map((length) => length * unit);

/** Two people disagree here: a white square around the mark. */
const conflictFrame = (context: PaintContext, unit: number): void => {
  const half = OVERLAY_SIZES.nextRadius * unit;
  context.setLineDash([]);
  context.beginPath();
  context.rect(-half, -half, 2 * half, 2 * half);
  strokeWithHalo(context, OVERLAY_NEXT, OVERLAY_SIZES.line, unit);
};

/** The landmark asked for: larger, white, dashed, round for every role. */
const nextRing = (context: PaintContext, unit: number): void => {
  context.beginPath();
  context.arc(0, 0, OVERLAY_SIZES.nextRadius * unit, 0, 2 * Math.PI);
  context.setLineDash([]);
  context.strokeStyle = OVERLAY_HALO;
  context.lineWidth = (OVERLAY_SIZES.mark + 2 * OVERLAY_SIZES.halo) * unit;
  context.stroke();
  context.setLineDash(scaled(OVERLAY_DASHES.next, unit));
  context.strokeStyle = OVERLAY_NEXT;
  context.lineWidth = OVERLAY_SIZES.mark * unit;
  context.stroke();
};

/**
 * Paints one mark about `at`. `unit` is how many pixels of the canvas one px of the design is: a
 * mark keeps its size at any zoom.
 */
export const paintMark = (
  context: PaintContext,
  shape: MarkShape,
  at: StagePoint,
  unit = 1,
): void => {
  const tracked = shape.state === 'tracked';
  const colour = OVERLAY_COLOURS[shape.role];
  context.save();
  context.translate(at.x, at.y);
  context.lineJoin = 'round';
  context.lineCap = 'butt';
  if (shape.state === 'next') nextRing(context, unit);
  else {
    context.setLineDash(tracked ? scaled(OVERLAY_DASHES.tracked, unit) : []);
    outline(context, shape, unit);
    strokeWithHalo(context, colour, tracked ? OVERLAY_SIZES.tracked : OVERLAY_SIZES.mark, unit);
    if (!tracked) {
      context.setLineDash([]);
      context.beginPath();
      context.arc(0, 0, OVERLAY_SIZES.dot * unit, 0, 2 * Math.PI);
      context.fillStyle = colour;
      context.fill();
    }
    if (shape.state === 'conflict') conflictFrame(context, unit);
  }
  context.restore();
};

import { type Degrees, toRadians } from '#shared/geometry/units.ts';
import type { FramePoint, StagePoint } from '#shared/geometry/points.ts';
import {
  OVERLAY_COLOURS,
  OVERLAY_DASHES,
  OVERLAY_HALO,
  OVERLAY_SIZES,
} from '#shared/overlay/style.ts';
import type { Arc, Label, Line, Primitive, Ring, Stroke } from '#shared/overlay/types.ts';
import { paintMark, type PaintContext, strokeWithHalo } from './paint-marks.ts';
import { type Size, toStage, type Viewport } from './viewport.ts';

export interface PaintOptions {
  readonly viewport: Viewport;
  /** Size of what is painted on, in its own pixels; words are kept inside it. */
  readonly bounds: Size;
  /** Pixels of the canvas per px of the design; 1 on a stage that has its own pixel ratio. */
  readonly unit?: number;
}

const dashOf = (drawn: Line | Arc | Ring | Stroke, unit: number): number[] =>
  drawn.state === 'tracked' ? OVERLAY_DASHES.tracked.map((length) => length * unit) : [];

const stroke = (context: PaintContext, drawn: Line | Arc | Ring | Stroke, unit: number): void => {
  context.setLineDash(dashOf(drawn, unit));
  context.lineCap = 'round';
  strokeWithHalo(
    context,
    OVERLAY_COLOURS[drawn.role],
    drawn.state === 'tracked' ? OVERLAY_SIZES.tracked : OVERLAY_SIZES.line,
    unit,
  );
};

/** From the clock face of the overlay (0 up, 90 right) to the canvas's own (0 right, 90 down). */
const canvasAngle = (angle: Degrees): number => toRadians(angle) - Math.PI / 2;

const paintArc = (context: PaintContext, arc: Arc, at: StagePoint, radius: number): void => {
  const from = canvasAngle(arc.from);
  const to = canvasAngle(arc.to);
  const forward = (((to - from) % (2 * Math.PI)) + 2 * Math.PI) % (2 * Math.PI);
  context.beginPath();
  context.arc(at.x, at.y, radius, from, to, forward > Math.PI);
};

const paintLabel = (
  context: PaintContext,
  label: Label,
  at: StagePoint,
  bounds: Size,
  unit: number,
): void => {
  const size = OVERLAY_SIZES.text * unit;
  const gap = OVERLAY_SIZES.textGap * unit;
  context.font = `600 ${size}px "Source Sans 3", system-ui, sans-serif`;
  context.textBaseline = 'middle';
  context.textAlign = 'left';
  const width = context.measureText(label.text).width;
  const wanted =
    label.towards === 'right'
      ? at.x + gap
      : label.towards === 'left'
        ? at.x - gap - width
        : at.x - width / 2;
  const edge = 4 * unit;
  const x = Math.max(edge, Math.min(bounds.width - width - edge, wanted));
  const y = Math.max(size, Math.min(bounds.height - size, at.y));
  context.setLineDash([]);
  context.lineJoin = 'round';
  context.strokeStyle = OVERLAY_HALO;
  context.lineWidth = 2 * OVERLAY_SIZES.halo * unit;
  context.strokeText(label.text, x, y);
  context.fillStyle = OVERLAY_COLOURS[label.role];
  context.fillText(label.text, x, y);
};

/** Paints what `shared/overlay` returns, bottom first, with line widths that no zoom changes. */
export const paintOverlay = (
  context: PaintContext,
  primitives: readonly Primitive[],
  { viewport, bounds, unit = 1 }: PaintOptions,
): void => {
  const place = (point: FramePoint) => toStage(viewport, point);
  context.save();
  for (const drawn of primitives) {
    switch (drawn.kind) {
      case 'line': {
        const from = place(drawn.from);
        const to = place(drawn.to);
        context.beginPath();
        context.moveTo(from.x, from.y);
        context.lineTo(to.x, to.y);
        stroke(context, drawn, unit);
        break;
      }
      case 'stroke':
        context.beginPath();
        drawn.points.map(place).forEach(({ x, y }, n) => {
          if (n === 0) context.moveTo(x, y);
          else context.lineTo(x, y);
        });
        stroke(context, drawn, unit);
        break;
      case 'arc':
        paintArc(context, drawn, place(drawn.centre), drawn.radius * viewport.scale);
        stroke(context, drawn, unit);
        break;
      case 'label':
        paintLabel(context, drawn, place(drawn.at), bounds, unit);
        break;
      case 'ring':
        if (drawn.radius !== null) {
          const at = place(drawn.at);
          context.beginPath();
          context.arc(at.x, at.y, drawn.radius * viewport.scale, 0, 2 * Math.PI);
          stroke(context, drawn, unit);
          break;
        }
        paintMark(context, drawn, place(drawn.at), unit);
        break;
      default:
        paintMark(context, drawn, place(drawn.at), unit);
    }
  }
  context.restore();
};

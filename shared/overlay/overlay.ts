import type { LandmarkId, Marks, Side, View } from '#shared/landmarks/types.ts';
import type { FramePoint } from '#shared/geometry/points.ts';
import { markShapes, nextShape } from './mark-shapes.ts';
import { type HipCentres, segments } from './segments.ts';
import type { Primitive } from './types.ts';
import { type FrameValues, liftArc, valueLabels } from './value-labels.ts';

export interface OverlayInput {
  readonly view: View;
  readonly supportSide: Side;
  readonly marks: Marks;
  readonly hips: HipCentres;
  /** Null: figures are not to be shown, or there are none. */
  readonly values: FrameValues | null;
  readonly conflicts?: ReadonlySet<LandmarkId>;
  /** The landmark asked for and where it is expected. */
  readonly next?: { readonly landmark: LandmarkId; readonly at: FramePoint } | null;
}

/**
 * What is drawn on one frame, bottom first: lines, marks, words. Positions are pixels of the
 * upright source frame; sizes and colours stand in `style.ts`. Bench, replay, report and the
 * burned-in clip all paint exactly this.
 */
export const overlay = (input: OverlayInput): Primitive[] => {
  const { marks, view, supportSide, hips, values, conflicts, next } = input;
  return [
    ...segments(marks, view, hips, conflicts),
    ...(values && values.lift !== null ? liftArc(marks, view) : []),
    ...markShapes(marks, view, conflicts),
    ...(next ? [nextShape(next.landmark, view, next.at)] : []),
    ...(values ? valueLabels(values, marks, view, supportSide) : []),
  ];
};

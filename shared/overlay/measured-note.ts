import { halfWidthText, valueText } from '#shared/exports/value-text.ts';
import { capital } from '#shared/exports/running-text.ts';
import type { FramePoint } from '#shared/geometry/points.ts';
import { type FrameValue, frameValues } from '#shared/measures/frame-values.ts';
import type { FrameInput, MarkError } from '#shared/measures/inputs.ts';
import type { Setting } from '#shared/measures/measure.ts';
import { measureById } from '#shared/measures/registry.ts';
import type { MeasuredShape } from './notes.ts';

/** What a comment may show of a frame: the values that are known there, by measure. */
export const measurable = (frame: FrameInput, setting: Setting, error: MarkError): FrameValue[] =>
  frameValues(frame, setting, error).filter(({ value }) => value.missing === null);

const middle = (points: readonly FramePoint[]): { u: number; v: number } | null => {
  if (points.length === 0) return null;
  const mean = (of: (point: FramePoint) => number) =>
    points.reduce((sum, point) => sum + of(point), 0) / points.length;
  return { u: mean(({ u }) => u), v: mean(({ v }) => v) };
};

export interface MeasuredNote {
  readonly shape: MeasuredShape;
  /** Rests on a mark that was followed and that nobody has looked at. */
  readonly provisional: boolean;
}

/** A measure of the registry on one frame, with its ±, in the middle of what it is taken from; null where it is not known. */
export const measuredNote = (
  id: string,
  frame: FrameInput,
  setting: Setting,
  error: MarkError,
): MeasuredNote | null => {
  const measure = measureById(id);
  const known = measurable(frame, setting, error).find((each) => each.measure.id === id);
  if (!measure || known?.value.value === undefined || known.value.value === null) return null;
  const { view } = setting.rig.camera;
  const marks = measure.landmarks(setting.set, view).flatMap((landmark) => {
    const mark = frame.marks[landmark];
    return mark && !mark.hidden ? [mark] : [];
  });
  const at = middle(marks.map(({ point }) => point));
  if (!at) return null;
  const front = view === 'front';
  const within = halfWidthText(known, front);
  const value = valueText(measure, known.value.value, front);
  return {
    shape: {
      kind: 'measured',
      ...at,
      label: capital(measure.label),
      text: within === null ? value : `${value} ${within}`,
    },
    provisional: marks.some(({ source, looked }) => source === 'tracked' && !looked),
  };
};

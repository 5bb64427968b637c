import type { FrameInput, MarkError } from './inputs.ts';
import { levelFrame } from './level.ts';
import type { Measure, Setting, Value } from './measure.ts';
import { MEASURES } from './registry.ts';

/** One measure's value on one frame. */
export interface FrameValue {
  readonly measure: Measure;
  readonly value: Value;
}

/**
 * Every value of one frame that its view can show, each with its ± or the reason why there is none.
 * Quick enough to be called while a mark is dragged: the setting comes from the rep's course and
 * changes only with its quiet frames.
 */
export const frameValues = (
  input: FrameInput,
  setting: Setting,
  error: MarkError,
): readonly FrameValue[] => {
  const frame = levelFrame(input, setting.rig.camera, error);
  return MEASURES.filter(({ views }) => views.some((view) => view === setting.rig.camera.view)).map(
    (measure) => ({ measure, value: measure.value(frame, setting) }),
  );
};

import { measurable, type MeasuredNote, measuredNote } from '#shared/overlay/measured-note.ts';
import type { FrameInput } from '#shared/measures/inputs.ts';
import type { Measure } from '#shared/measures/measure.ts';
import type { CurrentRep } from '../model/bench-model.ts';

/** A measure of the registry on one frame of a rep, as a comment shows it; null where it is not known. */
export const noteOn = (
  { course, markError }: CurrentRep,
  frame: FrameInput,
  measure: string,
): MeasuredNote | null => course && measuredNote(measure, frame, course.setting, markError);

/** The measures that a comment at this frame may show. */
export const measuresOn = ({ course, markError }: CurrentRep, frame: FrameInput): Measure[] =>
  course ? measurable(frame, course.setting, markError).map(({ measure }) => measure) : [];

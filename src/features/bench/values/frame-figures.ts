import { degrees } from '#shared/geometry/units.ts';
import { landmarksOf } from '#shared/landmarks/table.ts';
import type { FrameInput } from '#shared/measures/inputs.ts';
import { type FrameValue, frameValues } from '#shared/measures/frame-values.ts';
import type { FrameValues } from '#shared/overlay/value-labels.ts';
import type { CurrentRep } from '../model/bench-model.ts';

export interface FrameFigures {
  readonly values: readonly FrameValue[];
  /** For the picture and the dials; null where neither lift nor turn is known. */
  readonly shown: FrameValues | null;
  readonly pelvisPart: number | null;
  readonly thighPart: number | null;
}

const NO_FIGURES: FrameFigures = { values: [], shown: null, pelvisPart: null, thighPart: null };

/** Every value of one frame, at once; the setting is that of the rep's quiet stance. */
export const figuresOf = (current: CurrentRep, frame: FrameInput): FrameFigures => {
  const { course } = current;
  if (!course) return NO_FIGURES;
  const values = frameValues(frame, course.setting, current.markError);
  const of = (id: string) => values.find(({ measure }) => measure.id === id)?.value ?? null;
  const angle = (value: number | null | undefined) =>
    value === null || value === undefined ? null : degrees(value);
  const lift = of('lift');
  const turn = of('turn');
  const provisional = landmarksOf(course.set).some((id) => {
    const mark = frame.marks[id];
    return mark !== undefined && !mark.hidden && mark.source === 'tracked' && !mark.looked;
  });
  const known = angle(lift?.value) !== null || angle(turn?.value) !== null;
  return {
    values,
    shown: known
      ? {
          lift: angle(lift?.value),
          liftHalfWidth: angle(lift?.halfWidth),
          turn: angle(turn?.value),
          turnHalfWidth: angle(turn?.halfWidth),
          provisional,
        }
      : null,
    pelvisPart: of('pelvis-part')?.value ?? null,
    thighPart: of('thigh-part')?.value ?? null,
  };
};

import { type Boundaries, NO_BOUNDARIES } from '#shared/contracts/reps.ts';
import { courseOfRep, isCourse } from '#shared/course/course-of-rep.ts';
import type { RepInput, RepPhases } from '#shared/course/types.ts';
import { ASSUMED_MARK_ERROR } from '#shared/measures/inputs.ts';
import { MOMENT_ORDER, MOMENTS } from '#shared/records/engine-input.ts';
import { shownSet } from '#shared/records/shared-quiet.ts';
import { frameAt } from '#shared/timing/timestamps.ts';
import type { Milliseconds } from '#shared/timing/units.ts';
import type { HandBoundaries } from './rep.entity.ts';

/** What hands have moved, as boundaries. */
export const byHand = (moved: HandBoundaries): Boundaries => ({
  ...NO_BOUNDARIES,
  ...Object.fromEntries(
    MOMENT_ORDER.flatMap((moment) => {
      const frame = moved[moment];
      return frame === undefined ? [] : [[moment, { frame, by: 'hand' }]];
    }),
  ),
});

const phasesOf = (rep: RepInput): RepPhases | null => {
  if (rep.frames.length === 0) return null;
  const course = courseOfRep(rep, shownSet(rep), ASSUMED_MARK_ERROR, { halfWidths: false });
  return isCourse(course) ? course.phases : null;
};

/** The moments of a rep: those moved by hand, and the rest as the marks say. */
export const boundariesOf = (
  rep: RepInput | null,
  times: readonly Milliseconds[],
  moved: HandBoundaries,
): Boundaries => {
  const hand = byHand(moved);
  const phases = rep && phasesOf(rep);
  if (!phases) return hand;
  const found = MOMENT_ORDER.map((moment) => {
    const time = phases.boundaries[MOMENTS[moment]];
    const frame = time === null ? null : frameAt(times, time);
    return [moment, hand[moment] ?? (frame === null ? null : { frame, by: 'found' })] as const;
  });
  return Object.fromEntries(found) as Boundaries;
};

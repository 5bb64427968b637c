import { courseOfRep, isCourse } from '#shared/course/course-of-rep.ts';
import { ASSUMED_MARK_ERROR } from '#shared/measures/inputs.ts';
import { shownSet } from '#shared/records/shared-quiet.ts';
import type { MarkableFrame } from '#shared/reliability/asked-frames.ts';
import type { PhasesByFrame } from '#shared/reliability/compare-markings.ts';
import type { FirstMark } from '#shared/reliability/marked-twice.ts';
import type { MarkRow } from '../marks/mark-store.ts';
import { repInput, type StoredRep, timesOfClip } from '../reps/reps.presenter.ts';

/** What a hand has said of a rep: what was tracked is not marked again. */
export const handMarks = (marks: readonly MarkRow[]): MarkRow[] =>
  marks.filter(({ present, source }) => present && source === 'hand');

/** Frames on which a hand has placed something, in order. */
export const handFrames = (marks: readonly MarkRow[]): number[] =>
  [...new Set(handMarks(marks).flatMap(({ frame, hidden }) => (hidden ? [] : [frame])))].sort(
    (a, b) => a - b,
  );

/** The frames that can be marked again, with the part of the rep and the lift that the first marks give them. */
export const markableFrames = (stored: StoredRep): MarkableFrame[] => {
  const input = repInput(stored, timesOfClip(stored.clip));
  const course =
    input && courseOfRep(input, shownSet(input), ASSUMED_MARK_ERROR, { halfWidths: false });
  const known = new Map(
    course && isCourse(course)
      ? course.frames.map((each) => [Number(each.frame), each] as const)
      : [],
  );
  return handFrames(stored.marks).map((frame) => ({
    frame,
    phase: known.get(frame)?.phase ?? null,
    lift: known.get(frame)?.lift ?? null,
  }));
};

export const phasesOf = (frames: readonly MarkableFrame[]): PhasesByFrame =>
  Object.fromEntries(frames.flatMap(({ frame, phase }) => (phase ? [[frame, phase]] : [])));

/** The first marks of some frames as they stand now. */
export const firstMarksOn = (marks: readonly MarkRow[], frames: ReadonlySet<number>): FirstMark[] =>
  handMarks(marks)
    .filter(({ frame }) => frames.has(frame))
    .map(({ frame, landmark, u, v, pictureLongEdge, byUser }) => ({
      frame,
      landmark,
      u,
      v,
      pictureLongEdge,
      byUser,
    }));

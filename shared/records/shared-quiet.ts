import { courseOfRep, isCourse } from '#shared/course/course-of-rep.ts';
import type { RepInput } from '#shared/course/types.ts';
import { landmarksOf } from '#shared/landmarks/table.ts';
import { LANDMARK_SETS, type LandmarkSetId } from '#shared/landmarks/types.ts';
import { ASSUMED_MARK_ERROR, type FrameInput } from '#shared/measures/inputs.ts';

/** The richest set with any of its own landmarks marked; the moments do not depend on the others. */
export const shownSet = (rep: RepInput): LandmarkSetId =>
  [...LANDMARK_SETS]
    .reverse()
    .find((set) =>
      landmarksOf(set).every((id) => rep.frames.some((frame) => frame.marks[id] !== undefined)),
    ) ?? 'bare';

/** Marked frames of a rep's own quiet stance, in order of time; none where it has no foot off or no scale. */
export const quietFramesOf = (rep: RepInput): readonly FrameInput[] => {
  if (rep.frames.length === 0) return [];
  const own = { ...rep, sharedQuiet: null };
  const course = courseOfRep(own, shownSet(own), ASSUMED_MARK_ERROR, { halfWidths: false });
  if (!isCourse(course)) return [];
  return own.frames.filter((_, n) => course.phases.byFrame[n] === 'quiet');
};

/** Fewer quiet frames than this give no zero for the turn. */
export const LEAST_QUIET_FRAMES = 3;

/** A rep of a clip, and the rep of the same clip whose quiet stance it takes (marching); null: its own. */
export interface Borrowing {
  readonly input: RepInput | null;
  readonly clipId: string;
  readonly quietFrom: string | null;
}

/**
 * The quiet stance that each rep takes from another, or null: the lender is a rep of the same clip and the same
 * support side, since the marks are named by side, and has enough quiet frames of its own.
 */
export const sharedQuietOf = (
  { input, clipId, quietFrom }: Borrowing,
  reps: readonly Borrowing[],
): readonly FrameInput[] | null => {
  if (!input || quietFrom === null || quietFrom === input.id) return null;
  const lender = reps.find((each) => each.clipId === clipId && each.input?.id === quietFrom)?.input;
  if (!lender || lender.supportSide !== input.supportSide) return null;
  const quiet = quietFramesOf(lender);
  return quiet.length < LEAST_QUIET_FRAMES ? null : quiet;
};

/** The same with every borrowed quiet stance filled in. */
export const withSharedQuiet = <T extends Borrowing>(reps: readonly T[]): T[] =>
  reps.map((rep) => {
    const sharedQuiet = sharedQuietOf(rep, reps);
    return rep.input && sharedQuiet ? { ...rep, input: { ...rep.input, sharedQuiet } } : rep;
  });

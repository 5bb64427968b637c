import { carriesWeight } from '#shared/course/carries-weight.ts';
import type { CourseFrame } from '#shared/course/types.ts';
import type { FrameMarks, MarkValue, PointValue } from '#shared/landmarks/commands.ts';
import { LANDMARK_IDS, type LandmarkId } from '#shared/landmarks/types.ts';
import type { FrameIndex } from '#shared/timing/units.ts';
import { SURE } from '#src/tracking/types.ts';
import type { FollowedCount } from '#src/ui/followed-words.ts';
import type { BenchRep } from '../model/bench-model.ts';

const isFollowed = (value: MarkValue | undefined): value is PointValue =>
  value?.to === 'point' && value.source === 'tracked';
const isHollow = (value: MarkValue | undefined): value is PointValue =>
  isFollowed(value) && !value.looked;

export const anyFollowed = (reps: readonly BenchRep[]): boolean =>
  reps.some(({ marks }) =>
    [...marks.values()].some((here) => LANDMARK_IDS.some((id) => isFollowed(here[id]))),
  );

/** One marked frame with marks that nobody has looked at. */
export interface HollowFrame {
  readonly rep: BenchRep;
  readonly frame: FrameIndex;
  readonly marks: FrameMarks;
  /** Landmarks that the tracker was not sure of, and that can change the reading. */
  readonly unsure: readonly LandmarkId[];
  /** Landmarks that it was not sure of either, but that carry no weight on this frame. */
  readonly slight: readonly LandmarkId[];
}

/** By rep, what is known of its frames. */
export type Courses = ReadonlyMap<string, ReadonlyMap<FrameIndex, CourseFrame>>;

/** Every frame that waits to be looked at, rep by rep. */
export const framesToLookAt = (
  reps: readonly BenchRep[],
  courses: Courses = new Map(),
): readonly HollowFrame[] =>
  reps.flatMap((rep) => {
    const known = courses.get(rep.rep.id);
    return [...rep.marks]
      .sort(([a], [b]) => a - b)
      .flatMap(([frame, marks]) => {
        const hollow = LANDMARK_IDS.filter((id) => isHollow(marks[id]));
        if (hollow.length === 0) return [];
        const doubted = hollow.filter((id) => {
          const mark = marks[id];
          return mark?.to === 'point' && (mark.confidence ?? 0) < SURE;
        });
        const [unsure, slight] = [true, false].map((counts) =>
          doubted.filter((id) => carriesWeight(id, known?.get(frame)) === counts),
        );
        return [{ rep, frame, marks, unsure: unsure ?? [], slight: slight ?? [] }];
      });
  });

export const hollowFrames = (reps: readonly BenchRep[]): number => framesToLookAt(reps).length;

/** How many marks there are, how many of them were followed, and how many of those a person looked at. */
export const countFollowed = (reps: readonly BenchRep[]): FollowedCount => {
  const count = { marks: 0, followed: 0, looked: 0 };
  for (const { marks } of reps)
    for (const here of marks.values())
      for (const id of LANDMARK_IDS) {
        const value = here[id];
        if (value?.to !== 'point') continue;
        count.marks += 1;
        if (!isFollowed(value)) continue;
        count.followed += 1;
        if (value.looked) count.looked += 1;
      }
  return count;
};

/** The next unsure frame after one, around the end; null where there is none. */
export const nextUnsure = (
  waiting: readonly HollowFrame[],
  frame: FrameIndex,
): HollowFrame | null => {
  const unsure = waiting.filter((each) => each.unsure.length > 0);
  return unsure.find((each) => each.frame > frame) ?? unsure[0] ?? null;
};

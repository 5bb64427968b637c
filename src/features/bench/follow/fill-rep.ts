import type { BenchDocument } from '#shared/contracts/bench.ts';
import type { Rep } from '#shared/contracts/reps.ts';
import { carriesWeight } from '#shared/course/carries-weight.ts';
import { courseOfRep, isCourse } from '#shared/course/course-of-rep.ts';
import type { CourseFrame } from '#shared/course/types.ts';
import { worthKeeping } from '#shared/course/worth-keeping.ts';
import {
  changing,
  type FrameMarks,
  markAt,
  type MarkingCommand,
  type MarksByFrame,
  type MarkValue,
} from '#shared/landmarks/commands.ts';
import { landmarkAt } from '#shared/landmarks/spots.ts';
import type { LandmarkId, LandmarkSetId } from '#shared/landmarks/types.ts';
import { ASSUMED_MARK_ERROR } from '#shared/measures/inputs.ts';
import { repInputOf } from '#shared/records/engine-input.ts';
import { frameIndex, type FrameIndex, type Milliseconds } from '#shared/timing/units.ts';
import type { Followed } from '#src/tracking/types.ts';
import type { Tracks } from './following.ts';
import { isKeyframe } from './keyframes.ts';

/** What filling a rep with followed marks rests on. */
export interface Filling {
  readonly rep: Rep;
  readonly marks: MarksByFrame;
  readonly tracks: Tracks;
  readonly document: BenchDocument;
  readonly times: readonly Milliseconds[];
  readonly set: LandmarkSetId;
  /** Long edge, px, of the picture that the tracker looked at. */
  readonly pictureLongEdge: number;
}

/** A followed place as a mark: hollow until a person has looked at it. */
const markOf = (place: Followed, pictureLongEdge: number): MarkValue | null =>
  place.point && {
    to: 'point',
    point: place.point,
    source: 'tracked',
    looked: false,
    confidence: place.confidence,
    pictureLongEdge,
  };

/** Where the landmarks of this rep were followed to on one frame. */
const followedOn = (
  { rep, tracks }: Pick<Filling, 'rep' | 'tracks'>,
  frame: number,
): (readonly [LandmarkId, Followed])[] =>
  [...tracks].flatMap(([spot, places]) => {
    const id = landmarkAt(spot, rep);
    const place = places[frame];
    return id && place ? [[id, place] as const] : [];
  });

/** The rep as if every frame were marked: what a person placed, and what was followed elsewhere. */
const denseMarks = (filling: Filling): MarksByFrame => {
  const { rep, marks, pictureLongEdge } = filling;
  const dense = new Map<FrameIndex, FrameMarks>();
  for (let n = rep.startFrame; n <= rep.endFrame; n += 1) {
    const frame = frameIndex(n);
    const followed = Object.fromEntries(
      followedOn(filling, n).flatMap(([id, place]) => {
        const mark = markOf(place, pictureLongEdge);
        return mark ? [[id, mark]] : [];
      }),
    );
    const all: FrameMarks = { ...followed, ...marks.get(frame) };
    if (Object.keys(all).length > 0) dense.set(frame, all);
  }
  return dense;
};

/** Frames on which a place that can change the reading is not sure. */
const doubtfulOf = (filling: Filling, frames: readonly CourseFrame[]): ReadonlySet<FrameIndex> =>
  new Set(
    frames
      .filter((own) =>
        followedOn(filling, own.frame).some(
          ([id, { state }]) => state !== 'sure' && carriesWeight(id, own),
        ),
      )
      .map(({ frame }) => frame),
  );

/** Frames whose marks carry the reading, and those that carry marks already. */
export const framesToFill = (filling: Filling): readonly FrameIndex[] => {
  const { rep, document, times, set, marks } = filling;
  const { clip, athlete } = document;
  const dense = denseMarks(filling);
  const input = repInputOf({ rep, clip, times, marks: dense, bodyHeightMm: athlete.heightMm });
  const course = input && courseOfRep(input, set, ASSUMED_MARK_ERROR, { halfWidths: false });
  const chosen =
    course && isCourse(course)
      ? worthKeeping(course.frames, doubtfulOf(filling, course.frames))
      : evenly([...dense.keys()], WITHOUT_COURSE);
  return [...new Set([...chosen, ...marks.keys()])].sort((a, b) => a - b);
};

/** Without scale or distance there is no lift to choose by. */
const WITHOUT_COURSE = 36;
const evenly = <T>(from: readonly T[], count: number): T[] =>
  from.filter(
    (_, n) => Math.floor((n * count) / from.length) !== Math.floor(((n - 1) * count) / from.length),
  );

/** Whether a followed mark may be put here: never over what a person has said. */
const isFree = (value: MarkValue | null): boolean =>
  value === null || (value.to === 'point' && !isKeyframe(value));

/** The marks that filling a rep adds. */
export const fillRep = (filling: Filling): MarkingCommand[] => {
  const { marks, pictureLongEdge } = filling;
  return changing(
    marks,
    framesToFill(filling).flatMap((frame) =>
      followedOn(filling, frame).flatMap(([landmark, place]) => {
        const after = markOf(place, pictureLongEdge);
        return after && isFree(markAt(marks, frame, landmark)) ? [{ frame, landmark, after }] : [];
      }),
    ),
  );
};

/** Followed marks of one landmark on the rep's marked frames of a span, after it was followed anew. */
export const refill = (
  filling: Omit<Filling, 'document' | 'times' | 'set'>,
  landmark: LandmarkId,
  [from, to]: readonly [number, number],
): MarkingCommand[] => {
  const { marks, pictureLongEdge } = filling;
  return changing(
    marks,
    [...marks.keys()]
      .filter((frame) => from <= frame && frame <= to && isFree(markAt(marks, frame, landmark)))
      .map((frame) => {
        const place = followedOn(filling, frame).find(([id]) => id === landmark)?.[1];
        return { frame, landmark, after: place ? markOf(place, pictureLongEdge) : null };
      }),
  );
};

import { courseOfRep, isCourse, type RepCourse } from '#shared/course/course-of-rep.ts';
import type { FramePhase, RepInput } from '#shared/course/types.ts';
import { framePoint } from '#shared/geometry/points.ts';
import type { FrameMarks, MarksByFrame, MarkValue } from '#shared/landmarks/commands.ts';
import type { LandmarkSetId } from '#shared/landmarks/types.ts';
import type { MarkError } from '#shared/measures/inputs.ts';
import type { ReadingCode } from '#shared/reading/types.ts';
import { type RepFacts, repInputOf } from '#shared/records/engine-input.ts';
import { isLandmark } from '#shared/records/stored-marks.ts';
import { type FrameIndex, frameIndex } from '#shared/timing/units.ts';
import type { MarkedTwice, PlacedMark } from './marked-twice.ts';

/** The part of the rep that each frame asked for belongs to; a frame of which it is unknown is absent. */
export type PhasesByFrame = Readonly<Record<number, FramePhase>>;

/** Lift and turn of one frame, degrees, by the first and by the second marking. */
export interface TwiceMeasured {
  readonly frame: number;
  readonly lift: readonly [first: number, second: number] | null;
  /** Null also for a quiet frame: the mean of these is zero by definition. */
  readonly turn: readonly [first: number, second: number] | null;
}

/** What a second marking has shown, kept as it was when it was finished. */
export interface SecondResult {
  readonly marks: readonly MarkedTwice[];
  /** Landmarks that one of the two markings hid and the other placed. */
  readonly hiddenOnce: number;
  readonly values: readonly TwiceMeasured[];
  /** The readings of these frames alone by each marking; null where one of them cannot be made. */
  readonly readings: readonly [first: ReadingCode, second: ReadingCode] | null;
  /** Millimetres per pixel of the source where the athlete stood; null where the scale is unknown. */
  readonly mmPerPx: number | null;
}

/** Marks by frame as the engine's input is made from them. */
export const marksByFrame = (marks: readonly PlacedMark[]): MarksByFrame => {
  const frames = new Map<FrameIndex, FrameMarks>();
  for (const { frame, landmark, u, v, pictureLongEdge } of marks) {
    if (!isLandmark(landmark)) continue;
    const value: MarkValue =
      u === null || v === null
        ? { to: 'hidden' }
        : {
            to: 'point',
            point: framePoint(u, v),
            source: 'hand',
            looked: true,
            confidence: null,
            pictureLongEdge,
          };
    const place = frameIndex(frame);
    frames.set(place, { ...frames.get(place), [landmark]: value });
  }
  return frames;
};

/**
 * These frames alone as a rep, divided as `phases` says. Null until the clip's size is known.
 */
export const inputOfMarking = (
  facts: Omit<RepFacts, 'marks'>,
  marks: readonly PlacedMark[],
  phases: PhasesByFrame,
): RepInput | null => {
  const input = repInputOf({ ...facts, marks: marksByFrame(marks) });
  return (
    input && {
      ...input,
      labels: input.frames.map(({ frame }) => phases[frame] ?? 'between'),
      excluded: null,
    }
  );
};

const courseOf = (
  input: RepInput | null,
  set: LandmarkSetId,
  error: MarkError,
): RepCourse | null => {
  if (!input) return null;
  const course = courseOfRep(input, set, error, { halfWidths: false });
  return isCourse(course) ? course : null;
};

const both = (
  first: number | null | undefined,
  second: number | null | undefined,
): readonly [number, number] | null =>
  typeof first === 'number' && typeof second === 'number' ? [first, second] : null;

/** Lift and turn of the frames of two markings, each against its own quiet frames. */
export const measuredTwice = (
  first: RepInput | null,
  second: RepInput | null,
  set: LandmarkSetId,
  error: MarkError,
): TwiceMeasured[] => {
  const before = courseOf(first, set, error);
  const after = new Map(courseOf(second, set, error)?.frames.map((each) => [each.frame, each]));
  return (before?.frames ?? []).map((one): TwiceMeasured => {
    const other = after.get(one.frame);
    return {
      frame: one.frame,
      lift: both(one.lift, other?.lift),
      turn: one.phase === 'quiet' ? null : both(one.turn, other?.turn),
    };
  });
};

/** Places that one marking hid and the other did not. */
export const countHiddenOnce = (
  first: readonly PlacedMark[],
  second: readonly PlacedMark[],
): number => {
  const again = new Map(second.map((mark) => [`${mark.frame} ${mark.landmark}`, mark.u === null]));
  return first.filter(({ frame, landmark, u }) => {
    const hidden = again.get(`${frame} ${landmark}`);
    return hidden !== undefined && hidden !== (u === null);
  }).length;
};

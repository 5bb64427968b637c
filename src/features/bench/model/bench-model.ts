import type { BenchDocument } from '#shared/contracts/bench.ts';
import type { Rep } from '#shared/contracts/reps.ts';
import { courseOfRep, isCourse, type RepCourse } from '#shared/course/course-of-rep.ts';
import type { CourseFrame, RepInput } from '#shared/course/types.ts';
import type { FrameMarks, MarksByFrame } from '#shared/landmarks/commands.ts';
import type { LandmarkId, LandmarkSetId, View } from '#shared/landmarks/types.ts';
import { ASSUMED_MARK_ERROR, type MarkError } from '#shared/measures/inputs.ts';
import type { Missing } from '#shared/measures/missing.ts';
import type { FrameIndex, Milliseconds } from '#shared/timing/units.ts';
import type { QueuedMark } from '../queue/queue-core.ts';
import { repInputOf } from '#shared/records/engine-input.ts';
import { withSharedQuiet } from '#shared/records/shared-quiet.ts';
import { isDraft, touchedOnce } from './draft.ts';
import { hillOf, type HillPoint } from './hill.ts';
import { type Extra, ledLandmarks, nextLandmark, proposedSet } from './led.ts';
import { type RepTieFault, type Tying, withTiedLift } from '#shared/records/tied-lifts.ts';
import { otherReps } from './other-reps.ts';
import { marksWith } from '#shared/records/stored-marks.ts';

export interface BenchRep extends Tying {
  readonly rep: Rep;
  readonly marks: MarksByFrame;
  readonly input: RepInput | null;
  /** Why it does not take the lift of the side rep that it names. */
  readonly tieFault: RepTieFault | null;
}

/** The rep that is worked on, with all that follows from its marks at once. */
export interface CurrentRep extends BenchRep {
  readonly course: RepCourse | null;
  /** Why there is no course at all. */
  readonly courseMissing: Missing | null;
  readonly frames: readonly CourseFrame[];
  readonly hill: readonly HillPoint[];
  /** What one anatomical mark of this rep's side is taken to be wrong by. */
  readonly markError: MarkError;
}

export interface BenchModel {
  readonly reps: readonly BenchRep[];
  /** A clip without reps is worked on as a draft of one; see draft.ts. */
  readonly current: CurrentRep | null;
  readonly view: View;
  readonly set: LandmarkSetId;
  readonly led: readonly LandmarkId[];
  /** Figures of the current rep's side may be shown: there is a call by eye. */
  readonly figures: boolean;
}

/** Reps with their marks, waiting ones laid over. */
export const repsOf = (
  document: BenchDocument,
  waiting: readonly QueuedMark[],
  times: readonly Milliseconds[],
): BenchRep[] => {
  const own = withSharedQuiet(
    document.reps.map(({ rep, marks: stored }) => {
      const own = waiting.filter((each) => each.repId === rep.id && each.state.is !== 'refused');
      const marks = marksWith(stored, own);
      const { clip } = document;
      const bodyHeightMm = document.athlete.heightMm;
      const input = repInputOf({ rep, clip, times, marks, bodyHeightMm });
      const clap = rep.clapFrame === null ? null : (times[rep.clapFrame] ?? null);
      const { quietFrom, liftFrom } = rep;
      return { rep, marks, input, clipId: clip.id, quietFrom, liftFrom, clap };
    }),
  );
  const all = [...own, ...(own.some(({ liftFrom }) => liftFrom) ? otherReps(document) : [])];
  return own.map((each) => withTiedLift(each, all));
};

export const holds = ({ rep }: BenchRep, frame: number): boolean =>
  rep.startFrame <= frame && frame <= rep.endFrame;

/** The rep that is worked on: the chosen one, until the frame on show lies in another. */
export const currentRep = (
  reps: readonly BenchRep[],
  id: string | null,
  frame: FrameIndex,
): BenchRep | null => {
  const chosen = reps.find((each) => each.rep.id === id);
  if (chosen && holds(chosen, frame)) return chosen;
  return reps.find((each) => holds(each, frame)) ?? chosen ?? repAt(reps, frame);
};

/** The rep whose span holds a frame; the nearest one where none does. */
export const repAt = (reps: readonly BenchRep[], frame: FrameIndex): BenchRep | null => {
  const away = ({ rep }: BenchRep) =>
    frame < rep.startFrame ? rep.startFrame - frame : Math.max(0, frame - rep.endFrame);
  return reps.reduce<BenchRep | null>(
    (best, each) => (best === null || away(each) < away(best) ? each : best),
    null,
  );
};

export const withCourse = (
  chosen: BenchRep,
  set: LandmarkSetId,
  markError: MarkError = ASSUMED_MARK_ERROR,
): CurrentRep => {
  const none = { ...chosen, course: null, frames: [], hill: [], markError };
  if (!chosen.input) return { ...none, courseMissing: null };
  const course = courseOfRep(chosen.input, set, markError, { halfWidths: false });
  if (!isCourse(course)) return { ...none, courseMissing: course };
  return {
    ...chosen,
    course,
    courseMissing: null,
    frames: course.frames,
    hill: hillOf(course.frames),
    markError,
  };
};

export const modelOf = (
  document: BenchDocument,
  reps: readonly BenchRep[],
  current: CurrentRep | null,
  set: LandmarkSetId,
  extras: readonly Extra[],
): BenchModel => {
  const view = current?.rep.view ?? document.clip.view;
  return {
    reps,
    current,
    view,
    set,
    led: ledLandmarks(view, set, extras),
    figures:
      current !== null &&
      !isDraft(current) &&
      document.calls.some((call) => call.side === current.rep.supportSide),
  };
};

/** The set chosen by hand, or the richest one whose pointer lengths are known. */
export const setOf = (document: BenchDocument, chosen: LandmarkSetId | null): LandmarkSetId =>
  chosen ?? proposedSet(document.clip.geometry);

const NONE: FrameMarks = {};
export const marksOn = (current: BenchRep | null, frame: FrameIndex): FrameMarks =>
  current?.marks.get(frame) ?? NONE;

/** What is asked for on a frame: what the hand chose, else the next that is not done. */
export const askedFor = (
  model: BenchModel,
  frame: FrameIndex,
  chosen: LandmarkId | null,
  lastPlaced: LandmarkId | null,
): LandmarkId | null => {
  const { current } = model;
  if (!current || frame < current.rep.startFrame || frame > current.rep.endFrame) return null;
  const marks = isDraft(current) ? touchedOnce(current.marks) : marksOn(current, frame);
  return chosen ?? nextLandmark(model.led, marks, lastPlaced);
};

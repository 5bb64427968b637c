import type { PublicReplay } from '#shared/contracts/replays.ts';
import { courseOfRep, isCourse, type RepCourse } from '#shared/course/course-of-rep.ts';
import { type LiftWay, liftWay } from '#shared/course/match-lifts.ts';
import type { CourseFrame } from '#shared/course/types.ts';
import type { Degrees } from '#shared/geometry/units.ts';
import { ASSUMED_MARK_ERROR } from '#shared/measures/inputs.ts';
import { measuredNote } from '#shared/overlay/measured-note.ts';
import type { MeasuredShape } from '#shared/overlay/notes.ts';
import { shownSet } from '#shared/records/shared-quiet.ts';
import { frameAt } from '#shared/timing/timestamps.ts';
import type { Milliseconds } from '#shared/timing/units.ts';
import type { Gates } from '#shared/protocol/protocol.ts';
import { repInput, type StoredRep, timesOfClip } from '../reps/reps.presenter.ts';

/** A moment counts as a gate where a marked frame of the rise comes as near to it as this, degrees. */
const NEAR = 6;

const NO_MOMENTS: PublicReplay['moments'] = { quiet: null, from: null, to: null, top: null };

const nearest = (rise: readonly CourseFrame[], lift: number): number | null => {
  const away = (frame: CourseFrame) => Math.abs((frame.lift ?? Infinity) - lift);
  const [first, ...rest] = rise;
  if (!first) return null;
  const best = rest.reduce((near, frame) => (away(frame) < away(near) ? frame : near), first);
  return away(best) <= NEAR ? best.frame : null;
};

const momentsOf = (
  { frames, phases }: RepCourse,
  times: readonly Milliseconds[],
  gates: Gates,
): PublicReplay['moments'] => {
  const quiet = frames.filter(({ phase }) => phase === 'quiet');
  const rise = frames.filter(({ phase }) => phase === 'rise');
  const { top } = phases.boundaries;
  return {
    quiet: quiet[quiet.length >> 1]?.frame ?? null,
    from: nearest(rise, gates.from),
    to: nearest(rise, gates.to),
    top: top === null ? null : frameAt(times, top),
  };
};

/** What the marks of the played span show, with the same code as the Bench. */
export interface Span {
  /** By what it is shown beside another. */
  readonly way: LiftWay;
  /** A measure of the registry on one frame, as far as it may be told. */
  readonly measured: (id: string, frame: number) => MeasuredShape | null;
  readonly moments: PublicReplay['moments'];
  readonly overlay: PublicReplay['overlay'];
  readonly course: PublicReplay['course'];
}

/**
 * @param figures false leaves every angle out: what was seen and not measured carries none
 * @param from first frame of the span, `to` its last, both inclusive
 */
export const spanOf = (
  stored: StoredRep,
  { from, to }: { readonly from: number; readonly to: number },
  { figures, gates }: { readonly figures: boolean; readonly gates: Gates },
): Span => {
  const times = timesOfClip(stored.clip);
  const input = repInput(stored, times);
  const course =
    input && input.frames.length > 0
      ? courseOfRep(input, shownSet(input), ASSUMED_MARK_ERROR, { halfWidths: figures })
      : null;
  const known = course && isCourse(course) ? course : null;
  const inside = (frame: number) => frame >= from && frame <= to;
  const values = new Map<number, CourseFrame>(known?.frames.map((frame) => [frame.frame, frame]));
  const angle = (value: Degrees | null | undefined) => (figures ? (value ?? null) : null);
  const marked = [...new Set(stored.marks.map(({ frame }) => frame))].filter(inside);
  const overlay = marked.map((frame) => ({
    frame,
    marks: stored.marks.flatMap(({ frame: of, hidden, landmark, u, v, looked }) =>
      of === frame && !hidden && u !== null && v !== null ? [{ landmark, u, v, looked }] : [],
    ),
    lift: angle(values.get(frame)?.lift),
    liftPlusMinus: angle(values.get(frame)?.liftHalfWidth),
    turn: angle(values.get(frame)?.turn),
    turnPlusMinus: angle(values.get(frame)?.turnHalfWidth),
  }));
  const measured: Span['measured'] = (id, frame) => {
    const on = figures ? input?.frames.find((each) => Number(each.frame) === frame) : undefined;
    const note = on && known && measuredNote(id, on, known.setting, ASSUMED_MARK_ERROR);
    return note && !note.provisional ? note.shape : null;
  };
  return {
    measured,
    way: liftWay(known?.frames.filter(({ frame }) => inside(frame)) ?? []),
    moments: known ? momentsOf(known, times, gates) : NO_MOMENTS,
    overlay,
    course:
      known && figures
        ? {
            frames: overlay.map(({ frame }) => frame),
            lift: overlay.map(({ lift }) => lift),
            turn: overlay.map(({ turn }) => turn),
          }
        : null,
  };
};

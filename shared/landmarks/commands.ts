import type { FramePoint } from '#shared/geometry/points.ts';
import type { FrameIndex } from '#shared/timing/units.ts';
import { LANDMARK_IDS, type LandmarkId } from './types.ts';

/** What a hand, or the tracker, says of one landmark on one frame. */
export type MarkValue = PointValue | HiddenValue;

export interface PointValue {
  readonly to: 'point';
  readonly point: FramePoint;
  readonly source: 'hand' | 'tracked';
  readonly looked: boolean;
  /** 0–1 for a tracked mark, null for a hand mark. */
  readonly confidence: number | null;
  /** Long edge, px, of the picture on which it was placed. */
  readonly pictureLongEdge: number;
}

export interface HiddenValue {
  readonly to: 'hidden';
}

/**
 * One change of one mark, with what was there before, so that its inverse needs nothing else.
 * Null is 'not marked'.
 */
export interface MarkingCommand {
  readonly frame: FrameIndex;
  readonly landmark: LandmarkId;
  readonly before: MarkValue | null;
  readonly after: MarkValue | null;
}

/** Marks of one rep: of every marked frame, its landmarks. */
export type MarksByFrame = ReadonlyMap<FrameIndex, FrameMarks>;
export type FrameMarks = Readonly<Partial<Record<LandmarkId, MarkValue>>>;

export const NO_MARKS: MarksByFrame = new Map();

export const markAt = (
  marks: MarksByFrame,
  frame: FrameIndex,
  landmark: LandmarkId,
): MarkValue | null => marks.get(frame)?.[landmark] ?? null;

export const sameValue = (a: MarkValue | null, b: MarkValue | null): boolean => {
  if (a === b) return true;
  if (!a || !b) return false;
  if (a.to === 'hidden' || b.to === 'hidden') return a.to === b.to;
  return (
    a.point.u === b.point.u &&
    a.point.v === b.point.v &&
    a.source === b.source &&
    a.looked === b.looked &&
    a.confidence === b.confidence &&
    a.pictureLongEdge === b.pictureLongEdge
  );
};

const put = (
  marks: MarksByFrame,
  frame: FrameIndex,
  landmark: LandmarkId,
  value: MarkValue | null,
): MarksByFrame => {
  const next = new Map(marks);
  const { [landmark]: _old, ...rest } = marks.get(frame) ?? {};
  const there: FrameMarks = value ? { ...rest, [landmark]: value } : rest;
  if (LANDMARK_IDS.some((id) => there[id])) next.set(frame, there);
  else next.delete(frame);
  return next;
};

/** Does the commands in their order. A frame whose last mark goes is no longer a marked frame. */
export const applyMarking = (
  marks: MarksByFrame,
  commands: readonly MarkingCommand[],
): MarksByFrame =>
  commands.reduce((state, each) => put(state, each.frame, each.landmark, each.after), marks);

/** What takes the commands back: each turned round, the last one first. */
export const inverseOf = (commands: readonly MarkingCommand[]): MarkingCommand[] =>
  commands.map((each) => ({ ...each, before: each.after, after: each.before })).reverse();

/** False where somebody else has changed one of the marks since the commands were made. */
export const stillAsLeft = (marks: MarksByFrame, commands: readonly MarkingCommand[]): boolean => {
  const last = new Map<string, MarkingCommand>();
  for (const each of commands) last.set(`${each.frame}/${each.landmark}`, each);
  return [...last.values()].every((each) =>
    sameValue(markAt(marks, each.frame, each.landmark), each.after),
  );
};

/** Commands that set marks to `after`; what would change nothing is left out. */
export const changing = (
  marks: MarksByFrame,
  wanted: readonly Omit<MarkingCommand, 'before'>[],
): MarkingCommand[] =>
  wanted
    .map((each) => ({ ...each, before: markAt(marks, each.frame, each.landmark) }))
    .filter((each) => !sameValue(each.before, each.after));

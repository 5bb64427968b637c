import type { Mark } from '#shared/contracts/reps.ts';
import { framePoint } from '#shared/geometry/points.ts';
import {
  applyMarking,
  type MarksByFrame,
  type MarkValue,
  NO_MARKS,
} from '#shared/landmarks/commands.ts';
import { LANDMARK_IDS, type LandmarkId } from '#shared/landmarks/types.ts';
import { frameIndex, type FrameIndex } from '#shared/timing/units.ts';

const KNOWN: ReadonlySet<string> = new Set(LANDMARK_IDS);
/** A landmark that this version of the page does not know is left alone. */
export const isLandmark = (id: string): id is LandmarkId => KNOWN.has(id);

/** The stored mark as the hand sees it. */
export const valueOf = (mark: Mark): MarkValue | null => {
  if (mark.hidden) return { to: 'hidden' };
  if (mark.u === null || mark.v === null) return null;
  return {
    to: 'point',
    point: framePoint(mark.u, mark.v),
    source: mark.source,
    looked: mark.looked,
    confidence: mark.confidence,
    pictureLongEdge: mark.pictureLongEdge,
  };
};

/** What a change says of one mark; a command that waits to be sent fits in. */
export interface MarkChange {
  readonly frame: FrameIndex;
  readonly landmark: LandmarkId;
  readonly after: MarkValue | null;
}

/** Stored marks with what waits on this device laid over them, oldest first. */
export const marksWith = (
  stored: readonly Mark[],
  waiting: readonly MarkChange[],
): MarksByFrame => {
  const frames = new Map<FrameIndex, Partial<Record<LandmarkId, MarkValue>>>();
  for (const mark of stored) {
    const value = valueOf(mark);
    if (!value || !isLandmark(mark.landmark)) continue;
    const frame = frameIndex(mark.frame);
    const there = frames.get(frame) ?? {};
    there[mark.landmark] = value;
    frames.set(frame, there);
  }
  const base: MarksByFrame = frames.size === 0 ? NO_MARKS : frames;
  return applyMarking(
    base,
    waiting.map((change) => ({ ...change, before: null })),
  );
};

/** Marked frames in order. */
export const markedFrames = (marks: MarksByFrame): FrameIndex[] =>
  [...marks.keys()].sort((a, b) => a - b);

import { type History, record } from '#shared/landmarks/commands-history.ts';
import type { LandmarkId } from '#shared/landmarks/types.ts';
import type { FrameIndex } from '#shared/timing/units.ts';
import type { BenchStep, RepMarks } from '../store/bench-store.ts';

/** The mark that a hand has just placed. */
export interface PlacedMark {
  readonly repId: string;
  readonly landmark: LandmarkId;
  readonly frame: FrameIndex;
}

/**
 * What was followed anew around a mark belongs to the step of that mark: one undo takes back both. It
 * is a step of its own where the hand has done something else meanwhile.
 */
export const withFollowed = (
  history: History<BenchStep>,
  placed: PlacedMark,
  parts: readonly RepMarks[],
): History<BenchStep> => {
  const last = history.done.at(-1);
  const own =
    last?.kind === 'marks' &&
    last.repId === placed.repId &&
    last.commands.some(
      ({ frame, landmark }) => frame === placed.frame && landmark === placed.landmark,
    );
  if (!own) return record(history, { kind: 'many-marks', parts });
  const { repId, commands } = last;
  return record(
    { done: history.done.slice(0, -1), undone: [] },
    { kind: 'many-marks', parts: [{ repId, commands }, ...parts], shown: placed.frame },
  );
};

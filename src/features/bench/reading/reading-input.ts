import type { BenchDocument } from '#shared/contracts/bench.ts';
import type { Side } from '#shared/contracts/primitives.ts';
import type { RepInput } from '#shared/course/types.ts';
import { CURRENT_ENGINE } from '#shared/reading/engine.ts';
import type { UnmarkedFrame } from '#shared/reading/next-frame.ts';
import type { ReadingInput } from '#shared/reading/types.ts';
import { repInputOf } from '#shared/records/engine-input.ts';
import { withSharedQuiet } from '#shared/records/shared-quiet.ts';
import { marksWith } from '#shared/records/stored-marks.ts';
import { frameIndex, type Milliseconds, milliseconds } from '#shared/timing/units.ts';
import type { BenchRep } from '../model/bench-model.ts';
import { markErrorOn } from '../model/mark-error-on.ts';

/** Reps of the visit's other clips, as the document brings them. */
export const otherInputs = ({ otherReps, athlete }: BenchDocument): RepInput[] =>
  withSharedQuiet(
    otherReps.map(({ clip, rep, marks, times }) => {
      const byFrame: Milliseconds[] = [];
      for (const { frame, milliseconds: at } of times) byFrame[frame] = milliseconds(at);
      const input = repInputOf({
        rep,
        clip,
        times: byFrame,
        marks: marksWith(marks, []),
        bodyHeightMm: athlete.heightMm,
      });
      return { input, clipId: clip.id, quietFrom: rep.quietFrom };
    }),
  ).flatMap(({ input }) => (input ? [input] : []));

/** What the reading of one side of this visit rests on; null where that side has no rep. */
export const readingInputOf = (
  document: BenchDocument,
  reps: readonly BenchRep[],
  side: Side,
): ReadingInput | null => {
  const own = reps.flatMap(({ input }) => (input ? [input] : []));
  const ofSide = [...own, ...otherInputs(document)].filter((rep) => rep.supportSide === side);
  if (ofSide.length === 0) return null;
  return {
    engine: CURRENT_ENGINE,
    supportSide: side,
    set: null,
    thighTurnsLittle: document.assumption.includes(side),
    markError: markErrorOn(document.markErrors, side),
    ownSystematic: null,
    reps: ofSide,
  };
};

/** Frames of a rep of this clip that carry no marks yet. */
export const unmarkedFrames = (
  { rep, marks }: BenchRep,
  times: readonly Milliseconds[],
): UnmarkedFrame[] => {
  const frames: UnmarkedFrame[] = [];
  for (let n = rep.startFrame; n <= rep.endFrame; n += 1) {
    const frame = frameIndex(n);
    const time = times[n];
    if (time !== undefined && !marks.has(frame)) frames.push({ rep: rep.id, frame, time });
  }
  return frames;
};

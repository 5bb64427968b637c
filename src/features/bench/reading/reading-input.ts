import type { BenchDocument } from '#shared/contracts/bench.ts';
import type { Side } from '#shared/contracts/primitives.ts';
import { CURRENT_ENGINE } from '#shared/reading/engine.ts';
import type { UnmarkedFrame } from '#shared/reading/next-frame.ts';
import type { ReadingInput } from '#shared/reading/types.ts';
import { withTiedLift } from '#shared/records/tied-lifts.ts';
import { frameIndex, type Milliseconds } from '#shared/timing/units.ts';
import type { BenchRep } from '../model/bench-model.ts';
import { markErrorOn } from '../model/mark-error-on.ts';
import { otherReps } from '../model/other-reps.ts';

/** What the reading of one side of this visit rests on; null where that side has no rep. */
export const readingInputOf = (
  document: BenchDocument,
  reps: readonly BenchRep[],
  side: Side,
): ReadingInput | null => {
  const others = otherReps(document);
  const all = [...reps, ...others];
  const ofSide = [...reps, ...others.map((other) => withTiedLift(other, all))]
    .flatMap(({ input }) => input ?? [])
    .filter((rep) => rep.supportSide === side);
  if (ofSide.length === 0) return null;
  return {
    engine: CURRENT_ENGINE,
    supportSide: side,
    set: null,
    thighTurnsLittle: document.assumption.includes(side),
    markError: markErrorOn(document.markErrors, side),
    ownSystematic: null,
    rules: document.protocol.rules,
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

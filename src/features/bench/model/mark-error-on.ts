import type { BenchDocument } from '#shared/contracts/bench.ts';
import type { Side } from '#shared/contracts/primitives.ts';
import { ASSUMED_MARK_ERROR, type MarkError } from '#shared/measures/inputs.ts';

/** The marking error that a reading of this side takes. */
export const markErrorOn = (known: BenchDocument['markErrors'], side: Side): MarkError => {
  const own = known.find((each) => each.side === side);
  return own ? { anatomicalPx: own.px, doublyMarkedFrames: own.frames } : ASSUMED_MARK_ERROR;
};

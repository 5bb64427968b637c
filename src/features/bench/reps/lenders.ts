import { LEAST_QUIET_FRAMES, quietFramesOf } from '#shared/records/shared-quiet.ts';
import type { BenchRep } from '../model/bench-model.ts';

const hasQuiet = ({ input }: BenchRep): boolean =>
  input !== null && quietFramesOf(input).length >= LEAST_QUIET_FRAMES;

/** Reps of the same side whose quiet stance a marked rep without one may take, nearest before it first. */
export const lendersOf = (own: BenchRep, reps: readonly BenchRep[]): readonly BenchRep[] => {
  if (own.marks.size === 0 || own.rep.view !== 'front' || hasQuiet(own)) return [];
  return reps
    .filter(
      (each) =>
        each.rep.id !== own.rep.id &&
        each.rep.supportSide === own.rep.supportSide &&
        each.rep.quietFrom === null &&
        hasQuiet(each),
    )
    .sort(
      (a, b) =>
        Math.abs(a.rep.startFrame - own.rep.startFrame) -
        Math.abs(b.rep.startFrame - own.rep.startFrame),
    );
};

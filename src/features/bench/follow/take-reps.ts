import type { BenchDocument } from '#shared/contracts/bench.ts';
import type { Rep } from '#shared/contracts/reps.ts';
import type { FoundRep } from '#shared/course/find-reps.ts';
import {
  applyMarking,
  changing,
  type MarkingCommand,
  NO_MARKS,
} from '#shared/landmarks/commands.ts';
import { landmarkAt } from '#shared/landmarks/spots.ts';
import type { LandmarkSetId } from '#shared/landmarks/types.ts';
import { frameIndex, type FrameIndex, type Milliseconds } from '#shared/timing/units.ts';
import type { Touches } from '../model/draft.ts';
import type { RepMarks } from '../store/bench-store.ts';
import { fillRep } from './fill-rep.ts';
import type { Tracks } from './following.ts';

/** A touched frame this near before a rep, with the feet where they then stand, belongs to its quiet stance. */
const REACH_MS = 3000;

/** The reps with the touched frames in them, as far as they lie close before a quiet stance. */
export const withTouchedFrames = (
  found: readonly FoundRep[],
  touches: Touches,
  times: readonly Milliseconds[],
): FoundRep[] => {
  const frames = [...touches.keys()].sort((a, b) => a - b);
  return found.map((rep, n) => {
    const free = (found[n - 1]?.endFrame ?? -1) + 1;
    const first = frames.find(
      (frame) =>
        frame >= free &&
        frame < rep.startFrame &&
        (times[rep.startFrame] ?? 0) - (times[frame] ?? 0) <= REACH_MS,
    );
    return first === undefined || !rep.quiet
      ? rep
      : { ...rep, startFrame: frameIndex(first), quiet: [first, rep.quiet[1]] };
  });
};

/** The touches of a rep's frames as its first marks. */
export const touchedMarks = (rep: Rep, touches: Touches): MarkingCommand[] =>
  changing(
    NO_MARKS,
    [...touches].flatMap(([frame, spots]) =>
      frame < rep.startFrame || frame > rep.endFrame
        ? []
        : [...spots].flatMap(([spot, after]) => {
            const landmark = landmarkAt(spot, rep);
            return landmark ? [{ frame, landmark, after }] : [];
          }),
    ),
  );

export interface Taking {
  readonly document: BenchDocument;
  readonly touches: Touches;
  readonly tracks: Tracks;
  readonly times: readonly Milliseconds[];
  readonly set: LandmarkSetId;
  readonly pictureLongEdge: number;
}

/** The marks of reps that were just named: what was touched, and what was followed. */
export const marksOfTaken = (reps: readonly Rep[], taking: Taking): RepMarks[] =>
  reps.map((rep) => {
    const touched = touchedMarks(rep, taking.touches);
    const marks = applyMarking(NO_MARKS, touched);
    return { repId: rep.id, commands: [...touched, ...fillRep({ ...taking, rep, marks })] };
  });

/** Which of the named reps lends its quiet stance to each that has none: the nearest one of its side. */
export const lenders = (
  found: readonly FoundRep[],
  reps: readonly Rep[],
): readonly { readonly borrower: Rep; readonly lender: Rep }[] =>
  found.flatMap((own, n) => {
    const borrower = reps[n];
    if (own.quiet || !borrower) return [];
    const able = found.flatMap((each, m) => {
      const rep = reps[m];
      return rep && each.quiet && each.supportSide === own.supportSide ? [rep] : [];
    });
    const away = (rep: Rep): number => Math.abs(rep.startFrame - borrower.startFrame);
    const lender = able.sort((a, b) => away(a) - away(b))[0];
    return lender ? [{ borrower, lender }] : [];
  });

/** The frame to show after reps were taken: the first one touched in them, else where the first begins. */
export const firstToShow = (reps: readonly Rep[], touches: Touches): FrameIndex => {
  const [first] = reps;
  const touched = [...touches.keys()].find(
    (frame) => first && frame >= first.startFrame && frame <= first.endFrame,
  );
  return touched ?? frameIndex(first?.startFrame ?? 0);
};

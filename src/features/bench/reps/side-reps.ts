import type { BenchDocument } from '#shared/contracts/bench.ts';
import type { Rep } from '#shared/contracts/reps.ts';

type OtherRep = BenchDocument['otherReps'][number];

/** Reps of other clips that may show the same moment as this one: the other of front and lifted side, same leg. */
export const partnersOf = (rep: Rep, { otherReps }: BenchDocument): readonly OtherRep[] => {
  const wanted = { front: 'lifted-side', 'lifted-side': 'front', back: null, 'support-side': null };
  return otherReps.filter(
    (other) => other.rep.supportSide === rep.supportSide && other.rep.view === wanted[rep.view],
  );
};

/** What a rep of another clip is called. */
export const otherRepName = ({ clip, rep }: OtherRep): string =>
  `rep ${rep.number} of ${clip.name}`;

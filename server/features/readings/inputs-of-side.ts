import type { EntityManager } from '@mikro-orm/postgresql';
import type { Side } from '#shared/contracts/primitives.ts';
import { ASSUMED_MARK_ERROR, type MarkError } from '#shared/measures/inputs.ts';
import type { MarkRow } from '../marks/mark-store.ts';
import { finishedMarkings, ownErrorOf } from '../second-markings/finished-markings.ts';
import type { NumberedRep } from '../reps/stored-reps.ts';
import { type SideInputs, sideInputs } from './side-inputs.ts';
import type { SideSetting } from './side-setting.entity.ts';

/** The inputs that a side's reading is made from, and the error that would now be taken in its place, if another. */
export interface InputsOfSide {
  readonly inputs: SideInputs;
  readonly newer: MarkError | null;
}

/** Who has placed marks by hand. */
export const handsOn = (marks: readonly MarkRow[]): string[] => [
  ...new Set(marks.flatMap(({ source, byUser }) => (source === 'hand' ? [byUser] : []))),
];

/**
 * The marking error that a new reading of marks by these hands is made with: their own, the assumed one until they
 * have marked enough twice. Of several hands, the largest.
 */
export const errorOfHands = async (
  em: EntityManager,
  hands: readonly string[],
): Promise<MarkError> => {
  const finished = hands.length === 0 ? [] : await finishedMarkings(em, hands);
  return (
    hands
      .map((id) => ownErrorOf(finished, id))
      .reduce<MarkError | null>(
        (worst, each) => (worst && worst.anatomicalPx >= each.anatomicalPx ? worst : each),
        null,
      ) ?? ASSUMED_MARK_ERROR
  );
};

const same = (a: MarkError, b: MarkError): boolean =>
  a.anatomicalPx === b.anatomicalPx && a.doublyMarkedFrames === b.doublyMarkedFrames;

/**
 * A stored reading keeps the marking error that it was made with for as long as nothing else that it rests on has
 * changed; a new one takes the error of the hands that placed the marks.
 * @param setting with `reading` loaded, if it has one
 * @param anew take the newer error all the same
 * @returns null where no rep of the side carries a mark
 */
export const inputsOfSide = async (
  em: EntityManager,
  setting: SideSetting,
  reps: readonly NumberedRep[],
  side: Side,
  { anew = false }: { readonly anew?: boolean } = {},
): Promise<InputsOfSide | null> => {
  const ofSide = reps.filter(({ rep }) => rep.supportSide === side);
  const hands = handsOn(ofSide.flatMap(({ marks }) => marks));
  const now = await errorOfHands(em, hands);
  const fresh = sideInputs(reps, side, setting.assumption, now);
  if (!fresh) return null;
  const reading = setting.reading?.unwrap();
  if (!reading || anew) return { inputs: fresh, newer: null };
  const then: MarkError = {
    anatomicalPx: reading.markErrorPx,
    doublyMarkedFrames: reading.doublyMarkedFrames,
  };
  if (same(then, now)) return { inputs: fresh, newer: null };
  const kept = sideInputs(reps, side, setting.assumption, then);
  return kept?.hash === reading.inputHash
    ? { inputs: kept, newer: now }
    : { inputs: fresh, newer: null };
};

import type { EntityManager } from '@mikro-orm/postgresql';
import type { Side } from '#shared/contracts/primitives.ts';
import { ASSUMED_MARK_ERROR, type MarkError } from '#shared/measures/inputs.ts';
import { sameRules } from '#shared/protocol/protocol.ts';
import { CURRENT_ENGINE } from '#shared/reading/engine.ts';
import type { MarkRow } from '../marks/mark-store.ts';
import { finishedMarkings, ownErrorOf } from '../second-markings/finished-markings.ts';
import { currentProtocol } from '../protocol/current-protocol.ts';
import type { NumberedRep } from '../reps/stored-reps.ts';
import { type Grounds, type SideInputs, sideInputs } from './side-inputs.ts';
import type { SideSetting } from './side-setting.entity.ts';

/** The inputs that a side's reading is made from, and what would now be taken in the place of its grounds, if another. */
export interface InputsOfSide {
  readonly inputs: SideInputs;
  readonly newer: { readonly [K in keyof Grounds]: Grounds[K] | null };
}

const NOTHING_NEWER: InputsOfSide['newer'] = { markError: null, protocol: null, engine: null };

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
 * A stored reading keeps the marking error, the protocol and the engine that it was made with for as long as nothing
 * else that it rests on has changed; a new one takes the error of the hands that placed the marks, the protocol as it
 * stands and the current engine.
 * @param setting with `reading` and its protocol loaded, if it has one
 * @param anew take the newer ones all the same
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
  const now: Grounds = {
    markError: await errorOfHands(em, hands),
    protocol: await currentProtocol(em),
    engine: CURRENT_ENGINE,
  };
  const fresh = sideInputs(reps, side, setting.assumption, now);
  if (!fresh) return null;
  const reading = setting.reading?.unwrap();
  if (!reading || anew) return { inputs: fresh, newer: NOTHING_NEWER };
  const then: Grounds = {
    markError: {
      anatomicalPx: reading.markErrorPx,
      doublyMarkedFrames: reading.doublyMarkedFrames,
    },
    protocol: reading.protocol.unwrap(),
    engine: reading.engine,
  };
  const kept = sideInputs(reps, side, setting.assumption, then);
  if (kept?.hash !== reading.inputHash) return { inputs: fresh, newer: NOTHING_NEWER };
  const newer = {
    markError: same(then.markError, now.markError) ? null : now.markError,
    protocol: sameRules(then.protocol.values, now.protocol.values) ? null : now.protocol,
    engine: then.engine === now.engine ? null : now.engine,
  };
  return { inputs: kept, newer };
};

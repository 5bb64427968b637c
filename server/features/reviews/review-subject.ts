import type { UserActor } from '#shared/access/actors.ts';
import type { Side } from '#shared/contracts/primitives.ts';
import type { ReviewSubject } from '#shared/contracts/reviews.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { Problem } from '../../http/problem.ts';
import type { Athlete } from '../athletes/athlete.entity.ts';
import { Call } from '../calls/call.entity.ts';
import { sideSetting } from '../readings/current-reading.ts';
import { inputsOfSide } from '../readings/inputs-of-side.ts';
import type { Reading } from '../readings/reading.entity.ts';
import { markedReps } from '../readings/side-inputs.ts';

type Of = Unit<UserActor>;

/** What can be handed in, signed off and sent back of a side: it as it stands, and nothing older. */
export type Subject =
  | { readonly reading: Reading; readonly call: null }
  | { readonly reading: null; readonly call: Call };

/** The latest call by eye of a side. */
export const latestCall = (
  { em }: Pick<Of, 'em'>,
  visitId: string,
  side: Side,
): Promise<Call | null> =>
  em.findOne(Call, { visit: visitId, side }, { orderBy: { at: 'desc', id: 'desc' } });

const currentReadingOf = async (
  { em }: Of,
  visitId: string,
  side: Side,
  athlete: Athlete,
): Promise<Reading | null> => {
  const setting = await sideSetting(em, visitId, side);
  const reading = setting.reading?.unwrap();
  if (!reading) return null;
  const of = await inputsOfSide(em, setting, await markedReps(em, visitId, athlete), side);
  return of?.inputs.hash === reading.inputHash ? reading : null;
};

/**
 * The reading of the marks as they stand, or the latest call, if it is the one that was named.
 * @throws Problem 'edited-meanwhile' or 'reading-provisional'
 */
export const subjectAsItStands = async (
  unit: Of,
  visitId: string,
  side: Side,
  athlete: Athlete,
  about: ReviewSubject,
): Promise<Subject> => {
  if (about.kind === 'call') {
    const call = await latestCall(unit, visitId, side);
    if (call?.id !== about.id) throw new Problem('edited-meanwhile');
    return { reading: null, call };
  }
  const reading = await currentReadingOf(unit, visitId, side, athlete);
  if (reading?.id !== about.id) throw new Problem('edited-meanwhile');
  if (reading.provisional) throw new Problem('reading-provisional');
  return { reading, call: null };
};

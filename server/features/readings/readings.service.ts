import type { UserActor } from '#shared/access/actors.ts';
import type { Side } from '#shared/contracts/primitives.ts';
import type { SidePage } from '#shared/contracts/readings.ts';
import { otherSide } from '#shared/landmarks/types.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { tell } from '../../events/tell.ts';
import { Problem } from '../../http/problem.ts';
import { presentPerson } from '../accounts/accounts.presenter.ts';
import { Call } from '../calls/call.entity.ts';
import { presentCall } from '../calls/calls.presenter.ts';
import { audit, auditOnce } from '../audit/audit.ts';
import { presentProtocolRef } from '../protocol/protocol.presenter.ts';
import type { NumberedRep } from '../reps/stored-reps.ts';
import { type VisitInSight, visitInSight } from '../visits/visit-in-sight.ts';
import { agreementOf } from './agreement.ts';
import { currentReading, sideSetting } from './current-reading.ts';
import { Reading } from './reading.entity.ts';
import {
  compareSides,
  presentMarkError,
  presentReading,
  presentSummary,
} from './readings.presenter.ts';
import { inputsOfSide } from './inputs-of-side.ts';
import { markedReps } from './side-inputs.ts';

type Of = Unit<UserActor>;

const callsOf = (unit: Of, visitId: string): Promise<Call[]> =>
  unit.em.find(Call, { visit: visitId }, { populate: ['by'], orderBy: { at: 'asc', id: 'asc' } });

/** A side's reading as it stands, and that its figures have now been shown. */
const readingOfSide = async (
  { em }: Of,
  visitId: string,
  side: Side,
  reps: readonly NumberedRep[],
  options: { readonly anew?: boolean } = {},
) => {
  const setting = await sideSetting(em, visitId, side);
  const { assumption } = setting;
  const of = await inputsOfSide(em, setting, reps, side, options);
  if (!of) {
    setting.reading = null;
    return {
      assumption,
      reading: null,
      newerMarkError: null,
      newerProtocol: null,
      newerEngine: null,
    };
  }
  const reading = await currentReading(em, setting, of.inputs);
  setting.figuresShownAt ??= new Date();
  return {
    assumption,
    reading: presentReading(reading, of.inputs.reps),
    newerMarkError: of.newer.markError && presentMarkError(of.newer.markError),
    newerProtocol: of.newer.protocol && presentProtocolRef(of.newer.protocol),
    newerEngine: of.newer.engine,
  };
};

const pageOf = async (
  unit: Of,
  { visit, athlete, coach }: VisitInSight,
  side: Side,
  options: { readonly anew?: boolean } = {},
): Promise<SidePage> => {
  const { em } = unit;
  const calls = await callsOf(unit, visit.id);
  const callsOn = (which: Side) => calls.filter((call) => call.side === which).map(presentCall);
  if (callsOn(side).length === 0) throw new Problem('call-first');
  const reps = await markedReps(em, visit.id, athlete);
  const { assumption, ...read } = await readingOfSide(unit, visit.id, side, reps, options);
  const other = otherSide(side);
  const otherCalls = callsOn(other);
  const otherReading =
    otherCalls.length === 0 ? null : (await readingOfSide(unit, visit.id, other, reps)).reading;
  const history = await em.find(
    Reading,
    { visit: visit.id, side },
    { populate: ['by', 'protocol'], orderBy: { at: 'desc', id: 'desc' } },
  );
  await em.flush();
  const agreement = await agreementOf(em, coach.id);
  return {
    visit: { id: visit.id, day: visit.day },
    athlete: { id: athlete.id, name: `${athlete.givenName} ${athlete.familyName}` },
    side,
    calls: callsOn(side),
    ...read,
    history: history.map(presentSummary),
    otherSide:
      otherCalls.length === 0 ? null : { side: other, reading: otherReading, calls: otherCalls },
    compared: compareSides(read.reading, otherReading),
    agreement: agreement.of === 0 ? null : { coach: presentPerson(coach), ...agreement },
    assumption,
  };
};

/**
 * What the reps of one side say together.
 * @throws Problem 'call-first' until somebody has said what they saw on that side
 */
export const sideReading = async (unit: Of, visitId: string, side: Side): Promise<SidePage> => {
  const sight = await visitInSight(unit, visitId, 'athlete.read');
  const page = await pageOf(unit, sight, side);
  await auditOnce(unit, 'reading.open', visitId, { athlete: sight.athlete.id });
  return page;
};

/** Takes the planted thigh as turning little on this side, or stops doing so. */
export const setAssumption = async (
  unit: Of,
  visitId: string,
  side: Side,
  on: boolean,
): Promise<SidePage> => {
  const sight = await visitInSight(unit, visitId, 'reading.assume');
  const setting = await sideSetting(unit.em, visitId, side);
  setting.assumption = on;
  audit(unit, 'reading.assume', visitId, { athlete: sight.athlete.id, side, on });
  await unit.em.flush();
  await tell(unit, { coachId: sight.athlete.coach.id }, { type: 'reading', visitId, side });
  return pageOf(unit, sight, side);
};

/** Makes the reading of a side anew with the marking error and the protocol known now; the old one stays in the history. */
export const renewReading = async (unit: Of, visitId: string, side: Side): Promise<SidePage> => {
  const sight = await visitInSight(unit, visitId, 'reading.renew');
  const page = await pageOf(unit, sight, side, { anew: true });
  audit(unit, 'reading.renew', visitId, {
    athlete: sight.athlete.id,
    side,
    px: page.reading?.markError.px ?? null,
    protocol: page.reading?.protocol.version ?? null,
  });
  await unit.em.flush();
  await tell(unit, { coachId: sight.athlete.coach.id }, { type: 'reading', visitId, side });
  return page;
};

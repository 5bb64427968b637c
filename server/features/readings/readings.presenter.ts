import {
  type Reading as ReadingShape,
  readingLabel,
  type SidePage,
} from '#shared/contracts/readings.ts';
import type { MarkError } from '#shared/measures/inputs.ts';
import { gatesOf, sameGates } from '#shared/protocol/protocol.ts';
import { sidesDifference } from '#shared/reading/compare.ts';
import { presentPerson } from '../accounts/accounts.presenter.ts';
import { presentProtocolRef } from '../protocol/protocol.presenter.ts';
import type { NumberedRep } from '../reps/stored-reps.ts';
import { plusMinus } from './plus-minus.ts';
import type { Reading } from './reading.entity.ts';
import { resultOf } from './result-of.ts';

export const presentMarkError = ({ anatomicalPx, doublyMarkedFrames }: MarkError) => ({
  px: anatomicalPx,
  frames: doublyMarkedFrames,
});

export const presentSummary = (reading: Reading): SidePage['history'][number] => ({
  id: reading.id,
  engine: reading.engine,
  code: reading.code,
  label: readingLabel(reading.code, reading.before60, reading.gateFrom),
  change: reading.change ?? null,
  plusMinus: plusMinus(reading.u),
  by: presentPerson(reading.by.unwrap()),
  markError: presentMarkError({
    anatomicalPx: reading.markErrorPx,
    doublyMarkedFrames: reading.doublyMarkedFrames,
  }),
  protocol: presentProtocolRef(reading.protocol.unwrap()),
  at: reading.at.toISOString(),
});

const loaded = <T>(value: T | undefined): T => {
  if (value === undefined) throw new Error('A reading is presented with its result loaded.');
  return value;
};

const markingOf = (reps: readonly NumberedRep[]): ReadingShape['marking'] => {
  const marks = reps.flatMap((rep) => rep.marks.filter(({ hidden }) => !hidden));
  const followed = marks.filter(({ source }) => source === 'tracked');
  return {
    marks: marks.length,
    followed: followed.length,
    looked: followed.filter(({ looked }) => looked).length,
  };
};

/** @param reading with `result`, `by` and `protocol` loaded */
export const presentReading = (reading: Reading, reps: readonly NumberedRep[]): ReadingShape => ({
  ...presentSummary(reading),
  visitId: reading.visit.id,
  side: reading.side,
  inputHash: reading.inputHash,
  seed: reading.seed,
  u: reading.u ?? null,
  pEarly: reading.pEarly ?? null,
  smallestFound: reading.smallestFound ?? null,
  provisional: reading.provisional,
  assumption: reading.assumption,
  marking: markingOf(reps),
  result: resultOf(loaded(reading.result.unwrap())),
  reps: reps.map(({ rep, clip, number, tieFault }) => ({
    id: rep.id,
    clipId: clip.id,
    clipName: clip.name,
    number,
    excluded: rep.excluded ?? null,
    liftFrom: rep.liftFrom ?? null,
    tieFault: tieFault ?? null,
  })),
});

/** Left less right; null where they were read between other gates. Sides are never averaged. */
export const compareSides = (
  one: ReadingShape | null,
  other: ReadingShape | null,
): SidePage['compared'] => {
  const [left, right] = one?.side === 'left' ? [one, other] : [other, one];
  const from = left?.result.figures;
  const to = right?.result.figures;
  const alike = left && right && sameGates(gatesOf(left.result.rules), gatesOf(right.result.rules));
  const difference = from && to && alike ? sidesDifference(from, to) : null;
  return (
    difference && {
      difference: difference.value,
      plusMinus: difference.halfWidth,
      differ: difference.shown,
    }
  );
};

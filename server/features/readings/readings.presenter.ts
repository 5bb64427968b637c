import {
  type Reading as ReadingShape,
  type ReadingCode,
  type SidePage,
  READING_LABELS,
} from '#shared/contracts/readings.ts';
import type { MarkError } from '#shared/measures/inputs.ts';
import { sidesDifference } from '#shared/reading/compare.ts';
import { presentPerson } from '../accounts/accounts.presenter.ts';
import type { NumberedRep } from '../reps/stored-reps.ts';
import type { Reading } from './reading.entity.ts';

/** 95 % of true values lie within this many standard uncertainties. */
const COVERAGE = 1.96;

/** The words of a reading; what turns out already before 60° says so. */
export const readingLabel = (code: ReadingCode, before60: boolean): string =>
  code === 'early-turn-out' && before60
    ? `${READING_LABELS[code]}, before 60°`
    : READING_LABELS[code];

const plusMinus = (u: number | null): number | null => (u === null ? null : COVERAGE * u);

export const presentMarkError = ({ anatomicalPx, doublyMarkedFrames }: MarkError) => ({
  px: anatomicalPx,
  frames: doublyMarkedFrames,
});

export const presentSummary = (reading: Reading): SidePage['history'][number] => ({
  id: reading.id,
  engine: reading.engine,
  code: reading.code,
  label: readingLabel(reading.code, reading.before60),
  change: reading.change ?? null,
  plusMinus: plusMinus(reading.u ?? null),
  by: presentPerson(reading.by.unwrap()),
  markError: presentMarkError({
    anatomicalPx: reading.markErrorPx,
    doublyMarkedFrames: reading.doublyMarkedFrames,
  }),
  at: reading.at.toISOString(),
});

const loaded = <T>(value: T | undefined): T => {
  if (value === undefined) throw new Error('A reading is presented with its result loaded.');
  return value;
};

/** @param reading with `result` and `by` loaded */
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
  result: loaded(reading.result.unwrap()),
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

/** Left less right. Sides are never averaged. */
export const compareSides = (
  one: ReadingShape | null,
  other: ReadingShape | null,
): SidePage['compared'] => {
  const [left, right] = one?.side === 'left' ? [one, other] : [other, one];
  const from = left?.result.figures;
  const to = right?.result.figures;
  const difference = from && to ? sidesDifference(from, to) : null;
  return (
    difference && {
      difference: difference.value,
      plusMinus: difference.halfWidth,
      differ: difference.shown,
    }
  );
};

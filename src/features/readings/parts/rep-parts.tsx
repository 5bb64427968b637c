import type { Reading } from '#shared/contracts/readings.ts';
import type { Change, RepFit, RepResult } from '#shared/reading/types.ts';
import { capital, plusMinus, turn } from '#src/ui/figures.ts';
import { type Column, Table } from '#src/ui/table.tsx';
import { gateRange } from '#src/ui/gate-words.ts';
import { type Gates, gatesOf } from '#shared/protocol/protocol.ts';
import type { Degrees } from '#shared/geometry/units.ts';
import { repHalfWidth } from '#shared/reading/at-lift.ts';
import { drawnReps } from '../course/course-data.ts';
import { repName } from '../words/rep-names.ts';
import { repPartHalfWidth } from '#shared/reading/part-half-width.ts';

interface Row {
  readonly name: string;
  readonly rep: RepResult;
  readonly fit: RepFit;
}

function Figure({ label, value, half }: { label: string; value: number; half: number }) {
  return (
    <span className="whitespace-nowrap">
      <span className="text-soft tablet:hidden">{label} </span>
      {turn(value)} <span className="text-soft">{plusMinus(half)}</span>
    </span>
  );
}

const part = (label: string, gateTo: Degrees, of: (fit: RepFit) => Change): Column<Row> => ({
  key: label,
  label,
  cell: ({ rep, fit }) => (
    <Figure label={label} value={of(fit).value} half={repPartHalfWidth(rep, of(fit), gateTo)} />
  ),
});

const columnsOf = (gates: Gates): readonly Column<Row>[] => [
  { key: 'rep', label: `From ${gateRange(gates)}, ± 95 %`, cell: ({ name }) => name },
  {
    key: 'turn',
    label: 'turn',
    cell: ({ rep, fit }) => (
      <Figure label="turn" value={fit.change.value} half={repHalfWidth(rep, gates.to)} />
    ),
  },
  part('pelvis', gates.to, ({ pelvis }) => pelvis),
  part('thigh', gates.to, ({ thigh }) => thigh),
];

/** What pelvis and thigh did in each rep; a single rep is wider than all of them together. */
export function RepParts({ reading }: { reading: Reading }) {
  const rows = drawnReps(reading.result.reps).flatMap((rep): Row[] =>
    rep.fit ? [{ name: capital(repName(reading, rep.id)), rep, fit: rep.fit }] : [],
  );
  if (rows.length === 0) return null;
  return (
    <div className="mt-5 max-w-lead">
      <Table
        caption="Parts of the turn, rep by rep"
        columns={columnsOf(gatesOf(reading.result.rules))}
        rows={rows}
        rowKey={({ rep }) => rep.id}
      />
    </div>
  );
}

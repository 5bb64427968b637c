import { Link } from 'react-router-dom';
import type { VisitRow } from '#shared/contracts/visits.ts';
import type { Side } from '#shared/contracts/primitives.ts';
import { longDay } from '#src/ui/days.ts';
import { plusMinus, turn } from '#src/ui/figures.ts';
import { paths } from '#src/ui/paths.ts';
import { REVIEW_STATES } from '#src/ui/review-words.ts';
import { StateDot } from '#src/ui/state-dot.tsx';
import { Table, type Column } from '#src/ui/table.tsx';
import { SEEN_WORDS } from '#src/ui/words.ts';

type SideRow = VisitRow['sides'][number];
const sideOf = (visit: VisitRow, side: Side) => visit.sides.find((own) => own.side === side);

const COLUMNS: Column<VisitRow>[] = [
  {
    key: 'day',
    label: 'Visit',
    cell: (visit) => (
      <>
        <Link to={paths.visit(visit.id)} className="tap font-bold">
          {longDay(visit.day)}
        </Link>
        <span className="block text-note text-soft">
          {visit.clipCount === 0
            ? 'no clip yet'
            : visit.clipCount === 1
              ? '1 clip'
              : `${visit.clipCount} clips`}
        </span>
      </>
    ),
  },
  ...(['right', 'left'] as const).map((side) => ({
    key: side,
    label: `Standing on the ${side}`,
    cell: (visit: VisitRow) => <SideCell visit={visit} side={side} own={sideOf(visit, side)} />,
  })),
];

/** Every visit with what was seen and what was measured, side by side and never mixed. */
export function VisitTable({ visits }: { visits: readonly VisitRow[] }) {
  return <Table caption="Visits" columns={COLUMNS} rows={visits} rowKey={(visit) => visit.id} />;
}

function SideCell({ visit, side, own }: { visit: VisitRow; side: Side; own?: SideRow }) {
  const name = (
    <span className="text-soft tablet:hidden">{side === 'left' ? 'Left: ' : 'Right: '}</span>
  );
  if (own === undefined || (own.call === null && own.reading === null))
    return <span className="text-soft">{name}nothing yet</span>;
  if (own.reading === null)
    return (
      <>
        {name}
        <Link className="tap" to={paths.reading(visit.id, side)}>
          {own.call && SEEN_WORDS[own.call]}
        </Link>
        <span className="block text-note text-soft">seen by the coach, not measured</span>
        <Reviewed own={own} />
      </>
    );
  const { label, change, plusMinus: error, provisional } = own.reading;
  return (
    <>
      {name}
      <Link className="tap" to={paths.reading(visit.id, side)}>
        {label}
      </Link>
      <span className="block text-note text-soft">
        {change !== null && error !== null && `${turn(change)} ${plusMinus(error)}, `}
        {own.call === null ? 'no call by eye' : `by eye: ${SEEN_WORDS[own.call].toLowerCase()}`}
      </span>
      {provisional && <StateDot kind="wait">provisional</StateDot>}
      <Reviewed own={own} />
    </>
  );
}

function Reviewed({ own }: { own: SideRow }) {
  const state = REVIEW_STATES[own.review];
  return state && <StateDot kind={state.kind}>{state.words}</StateDot>;
}

import { Link } from 'react-router-dom';
import type { View } from '#shared/contracts/primitives.ts';
import type { Reading } from '#shared/contracts/readings.ts';
import type { ReadingResult } from '#shared/reading/types.ts';
import { decimal, degrees, turn } from '#src/ui/figures.ts';
import { Section } from '#src/ui/page.tsx';
import { paths } from '#src/ui/paths.ts';
import { type Column, Table } from '#src/ui/table.tsx';
import { missingWords } from '../words/missing-words.ts';
import { directionWords } from '../words/substitution-words.ts';
import { ChangeBar } from './change-bar.tsx';
import { type ChangeRow, changeRows } from '#shared/reading/changes.ts';

const changeText = ({ change, unit }: ChangeRow): string => {
  if (change === null) return '';
  return unit === 'degrees'
    ? turn(change)
    : `${Math.round(change) > 0 ? '+' : ''}${decimal(change, 0)} mm`;
};

const COLUMNS: readonly Column<ChangeRow>[] = [
  {
    key: 'measure',
    label: 'Change from quiet stance to the top',
    cell: (row) => (
      <>
        <Link to={paths.method(row.id)} className="tap font-bold">
          {row.label}
        </Link>{' '}
        <span className="text-soft">
          {row.change === null ? '' : directionWords(row.id, row.change)}
        </span>
      </>
    ),
  },
  {
    key: 'change',
    label: 'change',
    cell: (row) =>
      row.missing ? (
        <span className="text-soft">{missingWords(row.missing)}</span>
      ) : (
        <span className={row.beyond ? 'font-bold' : 'text-soft'}>{changeText(row)}</span>
      ),
  },
  {
    key: 'bar',
    label: 'drawn',
    heading: (
      <>
        <span className="sr-only">drawn from −10° to +10°, millimetres from −20 to +20</span>
        <span className="flex w-[200px] justify-between" aria-hidden="true">
          <span>−10°</span>
          <span>0</span>
          <span>+10°</span>
        </span>
      </>
    ),
    cell: (row) => (
      <div className="w-[200px] max-w-full">
        <ChangeBar row={row} />
      </div>
    ),
  },
  {
    key: 'limit',
    label: 'can be told from none beyond',
    end: true,
    cell: (row) =>
      row.smallest === null ? (
        <span className="text-soft">not known</span>
      ) : (
        <>
          <span className="text-soft tablet:hidden">told from none beyond </span>
          {row.unit === 'degrees' ? degrees(row.smallest) : `${decimal(row.smallest, 0)} mm`}
        </>
      ),
  },
];

/** Why the tilt of the pelvis is not known, by where the camera stood. */
const NO_TILT: Readonly<Record<View, string>> = {
  front: 'not seen from the front; film the support side to rule it in or out.',
  back: 'not seen from behind; film the support side to rule it in or out.',
  'lifted-side': 'not seen from the lifted side; film the support side to rule it in or out.',
  'support-side':
    'mark the front and the back corner of the hip bone, in quiet stance and at the top.',
};

/** Where every rep of the side was filmed from, unless one of them shows the turn. */
const viewOf = ({ reps }: ReadingResult): View => {
  const views = reps.map(({ why }) => {
    const fault = why.find(({ code }) => code === 'view-cannot-show-turn');
    return fault?.code === 'view-cannot-show-turn' ? fault.view : 'front';
  });
  if (views.includes('support-side')) return 'support-side';
  return views.includes('front') ? 'front' : (views[0] ?? 'front');
};

/** What else moved, each change against what can be told from none. */
export function SubstitutionsSection({ reading }: { reading: Reading }) {
  const rows = changeRows(reading.result);
  const seen = rows.filter(
    ({ missing, change }) => change !== null || missing?.code !== 'view-cannot-show-it',
  );
  const tilt = rows.find(({ id }) => id === 'pelvic-tilt');
  return (
    <Section
      title="Substitutions"
      wide
      note="What else moved. Grey: too small to tell from none. Zero is the quiet stance. Mean of the reps; the limit is that of one. Millimetres are drawn to 20."
    >
      {seen.length === 0 ? (
        <p className="text-soft">Nothing of it can be shown from these marks.</p>
      ) : (
        <Table caption="Substitutions" columns={COLUMNS} rows={seen} rowKey={({ id }) => id} />
      )}
      {(!tilt || tilt.change === null) && (
        <p className="mt-4 max-w-lead">
          <b>Pelvic tilt:</b> {NO_TILT[viewOf(reading.result)]} A pelvis tipped forward would make
          turning out harder, so the two are read together.{' '}
          {viewOf(reading.result) !== 'support-side' && (
            <Link to={paths.visit(reading.visitId)}>Film it</Link>
          )}
        </p>
      )}
    </Section>
  );
}

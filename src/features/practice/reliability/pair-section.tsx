import type { ReactNode } from 'react';
import type { MarkingPair } from '#shared/contracts/reliability.ts';
import { decimal } from '#src/ui/figures.ts';
import { landmarkInText, landmarkLabel } from '#src/ui/mark-error-words.ts';
import { Section } from '#src/ui/page.tsx';
import { type Column, Table } from '#src/ui/table.tsx';
import { answersWords, typicalWords } from './reliability-words.ts';
import { ValueFigures } from './value-figures.tsx';

type Row = MarkingPair['repeat']['landmarks'][number];

/** On a narrow page the headings are gone, so each figure says what it is. */
const named = (name: string) => <span className="text-soft tablet:hidden">{name} </span>;

const COLUMNS: readonly Column<Row>[] = [
  { key: 'landmark', label: 'Landmark', cell: ({ landmark }) => landmarkLabel(landmark) },
  {
    key: 'px',
    label: 'Typical error',
    cell: ({ px }) => (
      <>
        {named('typical error')}
        {decimal(px)} px
      </>
    ),
  },
  {
    key: 'mm',
    label: 'In mm',
    cell: ({ mm }) =>
      mm === null ? <span className="text-soft">no scale</span> : `${decimal(mm)} mm`,
  },
  {
    key: 'marks',
    label: 'Marked twice',
    cell: ({ marks }) => (
      <>
        {named('marked twice')}
        {marks}
      </>
    ),
  },
];

/** Frames that one marked first and one marked again. */
export function PairSection({
  title,
  note,
  figures,
  kind,
}: {
  title: string;
  note?: ReactNode;
  figures: Omit<MarkingPair, 'first' | 'second'>;
  kind: 'repeat' | 'between';
}) {
  const { repeat, turn, lift, readings } = figures;
  const [worst] = repeat.landmarks;
  return (
    <Section title={title} note={note}>
      <p className="text-lead">
        {kind === 'repeat' ? 'Marks repeat within ' : 'Marks agree within '}
        <b>{typicalWords(repeat.px, repeat.mm)}</b>
        {worst &&
          repeat.landmarks.length > 1 &&
          `; what repeats worst is the ${landmarkInText(worst.landmark)}`}
        .
      </p>
      <p className="text-note text-soft">
        {repeat.frames} {repeat.frames === 1 ? 'frame' : 'frames'}, {repeat.marks} anatomical marks,
        each placed twice.
      </p>
      {repeat.landmarks.length > 0 && (
        <div className="mt-4">
          <Table
            caption={`How well each landmark repeats, the worst first: ${title}`}
            columns={COLUMNS}
            rows={repeat.landmarks}
            rowKey={({ landmark }) => landmark}
          />
        </div>
      )}
      <ValueFigures what="turn" of={turn} whose={title} />
      <ValueFigures what="lift" of={lift} whose={title} />
      <h3 className="mt-6 font-bold">Readings of the same frames</h3>
      <p>{answersWords(readings, 'readings')}</p>
    </Section>
  );
}

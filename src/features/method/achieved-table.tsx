import { ACHIEVED, type Achieved } from '#shared/measures/achieved.ts';
import { decimal } from '#src/ui/figures.ts';
import { type Column, Table } from '#src/ui/table.tsx';

type Row = Achieved & { readonly name: string };

const ROWS: readonly Row[] = [
  { name: 'Bare landmarks', ...ACHIEVED.bare },
  { name: 'Belt pointer', ...ACHIEVED.belt },
  {
    name: 'Belt pointer, the thigh assumed to turn little',
    ...ACHIEVED['belt+assumption'],
  },
  { name: 'Belt and thigh pointers', ...ACHIEVED['belt+thigh'] },
];

const share = ({ hits, of }: { readonly hits: number; readonly of: number }): string =>
  `${decimal((100 * hits) / of)} % (${hits} of ${of})`;

const COLUMNS: Column<Row>[] = [
  { key: 'name', label: 'Landmarks', cell: ({ name }) => <b>{name}</b> },
  {
    key: 'assumed',
    named: true,
    label: 'No turn called early',
    cell: ({ falseEarly }) => share(falseEarly.assumed),
  },
  {
    key: 'harder',
    named: true,
    label: 'The same, with drifting marks or twice the slip',
    cell: ({ falseEarly }) => share(falseEarly.harder),
  },
  {
    key: 'told',
    named: true,
    label: 'Change told from none beyond, one rep and three',
    cell: ({ toldFromNone: { one, three } }) => `${decimal(one)}° and ${decimal(three)}°`,
  },
  {
    key: 'found',
    named: true,
    label: 'Early turn found nine times in ten, three reps',
    cell: ({ foundFrom }) =>
      foundFrom === null ? 'none up to 16°' : `from ${decimal(foundFrom)}°`,
  },
  {
    key: 'found62',
    named: true,
    label: 'Early turn of 6.2° found, three reps',
    cell: ({ found62 }) => share(found62),
  },
];

/** What the study of made people says of readings: one figure, one meaning. */
export function AchievedTable() {
  return (
    <Table
      caption="How often readings are right"
      columns={COLUMNS}
      rows={ROWS}
      rowKey={(r) => r.name}
    />
  );
}

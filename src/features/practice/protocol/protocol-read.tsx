import { useQuery } from '@tanstack/react-query';
import { figureWords } from '#shared/protocol/bounds.ts';
import { type Figure, FIGURE_GROUPS } from '#shared/protocol/figures.ts';
import type { Protocol } from '#shared/protocol/protocol.ts';
import { setUpsQuery } from '#src/api/visits.queries.ts';
import { Section } from '#src/ui/page.tsx';
import { type Column, Table } from '#src/ui/table.tsx';
import { Unstudied } from './unstudied.tsx';

const columnsOf = (values: Protocol): Column<Figure>[] => [
  { key: 'label', label: 'Figure', cell: ({ label }) => <b>{label}</b> },
  { key: 'value', label: 'Value', cell: ({ key }) => figureWords(key, values[key]) },
  {
    key: 'does',
    label: 'What it does',
    cell: ({ does, source }) => (
      <>
        {does} <span className="text-soft">({source})</span>
      </>
    ),
  },
];

/** The protocol for those who read by it and do not set it. */
export function ProtocolRead({ values }: { values: Protocol }) {
  const setUps = useQuery(setUpsQuery);
  const setUp = setUps.data?.items.find(({ id }) => id === values.setUpId)?.name;
  return (
    <>
      {FIGURE_GROUPS.map(({ title, figures }, n) => (
        <Section key={title} title={title} wide first={n === 0}>
          <Table
            caption={title}
            columns={columnsOf(values)}
            rows={figures}
            rowKey={({ key }) => key}
          />
          {n === 0 && <Unstudied rules={values} />}
          {n === FIGURE_GROUPS.length - 1 && (
            <p className="mt-4 max-w-lead">
              A new visit starts from {setUp ? `the set-up “${setUp}”` : 'no set-up'}. The planted
              thigh is {values.thighTurnsLittle ? '' : 'not '}taken as turning little, until a coach
              says otherwise for a side.
            </p>
          )}
        </Section>
      ))}
    </>
  );
}

import { useQuery } from '@tanstack/react-query';
import type { EyeAgreement } from '#shared/contracts/reviews.ts';
import { eyeAgreementQuery } from '#src/api/reviews.queries.ts';
import { decimal } from '#src/ui/figures.ts';
import { Section } from '#src/ui/page.tsx';
import { ErrorState, Loading } from '#src/ui/states.tsx';
import { type Column, Table } from '#src/ui/table.tsx';

const beyondChance = ({ kappa, why }: EyeAgreement['agreement']): string => {
  if (kappa !== null) return decimal(kappa, 2);
  return why === 'all-alike' ? 'always the same answer' : 'too few to say';
};

/** On a narrow page the headings are gone, so each figure says what it is. */
const named = (name: string) => <span className="text-soft tablet:hidden">{name} </span>;

const COLUMNS: readonly Column<EyeAgreement>[] = [
  { key: 'person', label: 'Who', cell: ({ person }) => <b>{person.name}</b> },
  {
    key: 'same',
    label: 'Agreed',
    cell: ({ agreement }) => (
      <>
        {named('agreed in')}
        {agreement.same} of {agreement.pairs}
      </>
    ),
  },
  {
    key: 'unsaid',
    label: 'Unsure or can’t tell',
    cell: ({ unsaid }) => (
      <>
        {named('unsure or can’t tell')}
        {unsaid}
      </>
    ),
  },
  {
    key: 'kappa',
    label: 'Beyond chance (kappa)',
    cell: ({ agreement }) => (
      <>
        {named('kappa')}
        {beyondChance(agreement)}
      </>
    ),
  },
];

/** The first call by eye of each coach against what was then measured. */
export function EyesSection() {
  const eyes = useQuery(eyeAgreementQuery);
  return (
    <Section
      title="How well each eye agrees"
      note="First calls, made before any figure was shown."
      margin={
        <p>
          The reading is no truth either: it has its own error. Kappa is 1 where both always say the
          same, 0 where they agree no more than by chance.
        </p>
      }
    >
      {eyes.isPending && <Loading label="Counting the calls" />}
      {eyes.isError && !eyes.data && (
        <ErrorState error={eyes.error} onRetry={() => void eyes.refetch()} />
      )}
      {eyes.data?.items.length === 0 && (
        <p className="text-soft">No side has both a call by eye and a reading yet.</p>
      )}
      {eyes.data && eyes.data.items.length > 0 && (
        <Table
          caption="Calls by eye against measured readings"
          columns={COLUMNS}
          rows={eyes.data.items}
          rowKey={({ person }) => person.id}
        />
      )}
    </Section>
  );
}

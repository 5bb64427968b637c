import type { SecondAgreement, SecondMarkingDocument } from '#shared/contracts/second-markings.ts';
import { useMe } from '#src/api/me.ts';
import { ButtonLink } from '#src/ui/button-link.tsx';
import { shortDay } from '#src/ui/days.ts';
import { decimal } from '#src/ui/figures.ts';
import { landmarkLabel } from '#src/ui/mark-error-words.ts';
import { Page, Section } from '#src/ui/page.tsx';
import { paths } from '#src/ui/paths.ts';
import { type Column, Table } from '#src/ui/table.tsx';
import { supportWords } from '#src/ui/words.ts';
import { readingsSentence, repeatSentence } from './blind-words.ts';

type Row = SecondAgreement['repeat']['landmarks'][number];

const COLUMNS: readonly Column<Row>[] = [
  { key: 'landmark', label: 'Landmark', cell: (row) => landmarkLabel(row.landmark) },
  { key: 'marks', label: 'Marked twice', cell: (row) => `${row.marks} times` },
  { key: 'px', label: 'Typical error', cell: (row) => `${decimal(row.px)} px` },
  { key: 'mm', label: 'In mm', cell: (row) => (row.mm === null ? '—' : `${decimal(row.mm)} mm`) },
];

/** How well the two markings agree, once the second is finished. */
export function BlindResult({
  second,
  agreement,
}: {
  second: SecondMarkingDocument;
  agreement: SecondAgreement;
}) {
  const { user } = useMe();
  const { summary, athlete, visit, clip, repNumber, supportSide } = second;
  const { repeat, firstBy, hiddenOnce, readings } = agreement;
  const own = summary.mine && firstBy.every(({ id }) => id === user.id);
  const others = firstBy.map(({ name }) => name).join(' and ');
  return (
    <Page
      title="Two markings compared"
      documentTitle={`Two markings compared: ${athlete.name}`}
      crumbs={[
        { label: athlete.name, to: paths.athlete(athlete.id) },
        { label: shortDay(visit.day), to: paths.visit(visit.id) },
        { label: `Rep ${repNumber}, ${supportWords(supportSide)}` },
      ]}
      lead={repeatSentence(repeat, own)}
      actions={
        <>
          <ButtonLink look="primary" to={paths.reliability()}>
            Reliability
          </ButtonLink>
          <ButtonLink to={paths.bench(clip.id)}>Back to the Bench</ButtonLink>
        </>
      }
    >
      <Section
        title="Landmarks"
        first
        note={`${repeat.frames} ${repeat.frames === 1 ? 'frame' : 'frames'}`}
        margin={
          <p>
            The typical error of one coordinate, √(Σd²/2n), in pixels of the phone’s picture. The
            figure above is of the anatomical landmarks; pointers and edges of the pelvis have
            errors of their own.
          </p>
        }
      >
        {repeat.landmarks.length === 0 ? (
          <p>No landmark was placed both times.</p>
        ) : (
          <Table
            caption="How well each landmark repeats, the worst first"
            columns={COLUMNS}
            rows={repeat.landmarks}
            rowKey={(row) => row.landmark}
          />
        )}
        {hiddenOnce > 0 && (
          <p className="mt-3 text-note text-soft">
            {hiddenOnce === 1 ? 'One landmark was' : `${hiddenOnce} landmarks were`} hidden in one
            marking and placed in the other.
          </p>
        )}
      </Section>
      <Section title="Reading">
        <p className="max-w-lead">{readingsSentence(readings)}</p>
      </Section>
      <Section title="Who">
        <p>
          First marks by {others === '' ? 'nobody who can be compared' : others}; second marks by{' '}
          {summary.marker.name}.
        </p>
      </Section>
    </Page>
  );
}

import { Link } from 'react-router-dom';
import { landmark, landmarksOf } from '#shared/landmarks/table.ts';
import { LANDMARK_SETS, type LandmarkSetId } from '#shared/landmarks/types.ts';
import { type Constant, CONSTANTS } from '#shared/measures/constants.ts';
import { FILMING_LIMITS } from '#shared/measures/filming-limits.ts';
import type { Measure } from '#shared/measures/measure.ts';
import { MEASURES } from '#shared/measures/registry.ts';
import { CURRENT_ENGINE } from '#shared/reading/engine.ts';
import { Page, Section } from '#src/ui/page.tsx';
import { type Column, Table } from '#src/ui/table.tsx';
import { AchievedTable } from './achieved-table.tsx';
import { gateRange, outOfHundred } from '#src/ui/gate-words.ts';
import { paths } from '#src/ui/paths.ts';
import { gatesOf, type ReadingRules } from '#shared/protocol/protocol.ts';
import { useProtocol } from '#src/api/use-protocol.ts';
import { useHashTarget } from '#src/ui/use-hash-target.ts';
import { LIMITS } from '#shared/measures/method-limits.ts';

const UNITS: Record<Measure['unit'], string> = { degrees: '°', millimetres: ' mm' };

const MEASURE_COLUMNS: Column<Measure>[] = [
  {
    key: 'label',
    label: 'Measure',
    cell: ({ id, label, sign }) => (
      <span id={id} tabIndex={-1} data-quiet-focus className="scroll-mt-4">
        <b>{label}</b>
        <br />
        <span className="text-soft">{sign}</span>
      </span>
    ),
  },
  { key: 'zero', label: 'Counted from', named: true, cell: ({ zero }) => zero },
  {
    key: 'views',
    label: 'Seen from',
    named: true,
    cell: ({ views }) => views.join(', ').replaceAll('-', ' '),
  },
  {
    key: 'smallest',
    named: true,
    label: 'Can be told from none beyond',
    cell: ({ smallestChange, unit }) =>
      smallestChange === null
        ? 'differs from rep to rep; it stands beside the value'
        : `${smallestChange}${UNITS[unit]}`,
  },
  {
    key: 'source',
    label: 'Source',
    cell: ({ source }) => <span className="text-soft">{source}</span>,
  },
];

const CONSTANT_COLUMNS: Column<Constant>[] = [
  { key: 'meaning', label: 'Number', cell: ({ meaning }) => meaning },
  {
    key: 'value',
    label: 'Value',
    cell: ({ value, unit }) => `${Number(value.toPrecision(4))} ${unit}`.trim(),
  },
  {
    key: 'source',
    label: 'Source',
    cell: ({ source }) => <span className="text-soft">{source}</span>,
  },
];

const SET_NAMES: Record<LandmarkSetId, string> = {
  bare: 'Bare landmarks',
  belt: 'Belt pointer',
  'belt+thigh': 'Belt and thigh pointers',
};

const neededWords = ({ early, turnIn, flat }: ReadingRules): string =>
  `A reading needs ${outOfHundred(early)} in 100 for turning out early, ${outOfHundred(turnIn)} for turning in and ${outOfHundred(flat)} for holding still; otherwise it is “Can’t tell yet”.`;

/** How each number is made and what it cannot say, written from the same tables that the engine reads. */
export function MethodPage() {
  const protocol = useProtocol();
  useHashTarget();
  return (
    <Page
      title="Method"
      lead="How each number is made, its error, where it comes from, and what a phone cannot see."
    >
      <Section id="measures" title="What is measured" wide first>
        <Table
          caption="Measures"
          columns={MEASURE_COLUMNS}
          rows={MEASURES}
          rowKey={({ id }) => id}
        />
      </Section>
      <Section
        id="landmark-sets"
        title="Landmark sets"
        note="A reading uses the richest set that has a usable rep."
        wide
      >
        <dl>
          {LANDMARK_SETS.map((set) => (
            <div key={set} className="border-b border-rule py-3">
              <dt className="font-bold">
                {SET_NAMES[set]}, {landmarksOf(set).length} a frame
              </dt>
              <dd className="max-w-lead text-soft">
                {landmarksOf(set)
                  .map((id) => landmark(id).label)
                  .join(' · ')}
              </dd>
            </div>
          ))}
        </dl>
      </Section>
      <Section id="reading" title="A reading">
        <p className="max-w-lead">
          What counts is the change of turn{' '}
          {protocol ? `from ${gateRange(gatesOf(protocol))}` : 'between the gates'} of lift, over
          the rise of every usable rep of one support side in one visit. With bare landmarks or a
          belt pointer alone all frames of all reps are read as one curve, pelvis and thigh each
          with its own error; with both pointers each rise is fitted and the reps are averaged. How
          well a clip is marked is learnt from how its marks scatter. Marking error, the spread
          between reps and slipping skin, which more marks do not lessen, give the uncertainty.
          Without the thigh pointer the probability also counts, with one chance in three, that skin
          slips twice as much as assumed. The same inputs give the same answer each time.{' '}
          {protocol && neededWords(protocol)} Readings name the engine they were made with and keep
          it: this is engine {CURRENT_ENGINE}.{' '}
          <Link to={paths.protocol()}>The practice’s protocol</Link>
        </p>
      </Section>
      <Section
        id="how-often-right"
        title="How often a reading is right"
        note="From made people of known truth, read by this engine; from our model, no source. A change told from none and an early turn found are not the same: what is found nine times in ten is larger."
        wide
      >
        <AchievedTable />
      </Section>
      <Section id="two-clips" title="Two clips of one rep">
        <p className="max-w-lead">
          A front and a lifted-side clip of the same moment can be tied: lift is then taken from the
          side, turn from the front. Their clocks are tied by what both show: foot off, reaching the
          top, foot down, or a clap; straight between these. The side clip’s foot is first moved to
          where the front camera saw it, since a foot that comes forward looks lower from above. How
          far the lift moves while the clocks may be apart is part of its ±; it moves all frames of
          the rep together, so that more frames do not lessen it. Where the time between two of
          these moments differs by more than frame steps and marks explain, the clips show different
          reps and are not tied; the page says so.
        </p>
      </Section>
      <Section title="What it cannot say" wide>
        <ul>
          {LIMITS.map(({ says, source }) => (
            <li key={says} className="max-w-lead border-b border-rule py-3">
              {says} <span className="text-soft">{source}</span>
            </li>
          ))}
        </ul>
      </Section>
      <Section title="Numbers of the engine" note="All that do not follow from geometry." wide>
        <Table
          caption="Constants"
          columns={CONSTANT_COLUMNS}
          rows={Object.values(CONSTANTS)}
          rowKey={({ meaning }) => meaning}
        />
      </Section>
      <Section
        id="filming"
        title="Limits of filming"
        note="Beyond them a clip is warned of before it is sent, and its reading afterwards."
        wide
      >
        <Table
          caption="Limits of filming"
          columns={CONSTANT_COLUMNS}
          rows={Object.values(FILMING_LIMITS)}
          rowKey={({ meaning }) => meaning}
        />
      </Section>
      <p className="pt-6 text-note text-soft">
        <Link to={paths.licences()}>Licences</Link> of the programs and letters that Redshank stands
        on.
      </p>
    </Page>
  );
}

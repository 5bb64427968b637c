import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import type { Reliability } from '#shared/contracts/reliability.ts';
import { useMe } from '#src/api/me.ts';
import { reliabilityOptions } from '#src/api/reliability.queries.ts';
import { ButtonLink } from '#src/ui/button-link.tsx';
import { Page, Section } from '#src/ui/page.tsx';
import { paths } from '#src/ui/paths.ts';
import { Empty, ErrorState, Loading } from '#src/ui/states.tsx';
import { type Column, Table } from '#src/ui/table.tsx';
import { answersWords, ownErrorWords, takenWords } from './reliability-words.ts';
import { PairSection } from './pair-section.tsx';

const LEAD = {
  coach: 'How well your own marks and calls repeat.',
  supervisor: 'How well marks and calls repeat, yours and those of the coaches assigned to you.',
  owner: 'How well marks and calls repeat in this practice.',
} as const;

/** `/practice/reliability`: from frames marked twice, blind. */
export function ReliabilityPage() {
  const { user } = useMe();
  const query = useQuery(reliabilityOptions());
  return (
    <Page
      title="Reliability"
      crumbs={[{ label: 'Practice', to: paths.practice() }, { label: 'reliability' }]}
      lead={LEAD[user.role]}
    >
      {query.isPending && <Loading label="Loading reliability" />}
      {query.isError && !query.data && (
        <ErrorState error={query.error} onRetry={() => void query.refetch()} />
      )}
      {query.data && <Found reliability={query.data} />}
    </Page>
  );
}

function Found({ reliability }: { reliability: Reliability }) {
  const { repeats, between, practice, calls, waiting } = reliability;
  const nothing = repeats.length === 0 && between.length === 0;
  return (
    <>
      {waiting.length > 0 && <Waiting waiting={waiting} />}
      <MarkErrors reliability={reliability} />
      {nothing && (
        <Section title="Frames marked twice">
          <Empty
            title="Nothing is marked twice yet"
            action={<ButtonLink to={paths.athletes()}>Choose an athlete</ButtonLink>}
          >
            On the Bench, under Reps, choose “Mark again, blind” for a rep with marks.
          </Empty>
        </Section>
      )}
      {repeats.length > 1 && practice && (
        <PairSection title="All repeats together" figures={practice} kind="repeat" />
      )}
      {repeats.map((pair) => (
        <PairSection
          key={pair.first.id}
          title={pair.first.name}
          note="marked twice by the same person"
          figures={pair}
          kind="repeat"
        />
      ))}
      {between.map((pair) => (
        <PairSection
          key={`${pair.first.id} ${pair.second.id}`}
          title={`${pair.first.name} and ${pair.second.name}`}
          note="marked by the first, then by the second"
          figures={pair}
          kind="between"
        />
      ))}
      <Section
        title="Calls by eye"
        margin={
          <p>First calls of two people on the same side, made before any figure was shown.</p>
        }
      >
        {calls.length === 0 ? (
          <p>No side has the calls of two people yet.</p>
        ) : (
          <ul>
            {calls.map(({ one, other, agreement }) => (
              <li
                key={`${one.id} ${other.id}`}
                className="border-b border-rule py-2.5 last:border-0"
              >
                <b>
                  {one.name} and {other.name}
                </b>
                <p>{answersWords(agreement, 'calls')}</p>
              </li>
            ))}
          </ul>
        )}
      </Section>
    </>
  );
}

function Waiting({ waiting }: { waiting: Reliability['waiting'] }) {
  return (
    <Section title="To mark again" first>
      <ul>
        {waiting.map(({ summary, athlete }) => (
          <li
            key={summary.id}
            className="flex flex-wrap items-center justify-between gap-x-4 border-b border-rule py-1 last:border-0"
          >
            <span>
              <b>{athlete.name}</b>, {summary.framesDone} of {summary.frames} frames done
              {!summary.mine || summary.askedBy.id === summary.marker.id
                ? ''
                : `, asked by ${summary.askedBy.name}`}
            </span>
            <Link to={paths.secondMarking(summary.id)} className="py-2.5">
              Go on
            </Link>
          </li>
        ))}
      </ul>
    </Section>
  );
}

function MarkErrors({ reliability }: { reliability: Reliability }) {
  const { people, least, waiting } = reliability;
  const columns: Column<Reliability['people'][number]>[] = [
    { key: 'person', label: 'Who', cell: ({ person }) => <b>{person.name}</b> },
    { key: 'taken', label: 'In new readings', cell: takenWords },
    {
      key: 'frames',
      label: 'Rests on',
      cell: (person) => <span className="text-soft">{ownErrorWords(person, least)}</span>,
    },
  ];
  return (
    <Section
      title="Marking error"
      first={waiting.length === 0}
      margin={
        <p>
          The error of one anatomical mark. From {least} frames marked twice on, a person’s own
          takes the place of the assumed 3 px in new readings of their marks. Readings made before
          stay as they are.
        </p>
      }
    >
      <Table
        caption="Marking error by person"
        columns={columns}
        rows={people}
        rowKey={({ person }) => person.id}
      />
    </Section>
  );
}

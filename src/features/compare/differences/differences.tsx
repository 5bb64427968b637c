import { Link } from 'react-router-dom';
import {
  type ComparedCourse,
  courseDifference,
  type CourseDifference,
  repCourse,
  sideCourse,
} from '#shared/reading/compare-courses.ts';
import type { Difference } from '#shared/reading/compare.ts';
import { gatesOf } from '#shared/protocol/protocol.ts';
import { MethodLink } from '#src/ui/method-link.tsx';
import { Section } from '#src/ui/page.tsx';
import { paths } from '#src/ui/paths.ts';
import { Caution } from '#src/ui/states.tsx';
import { type Column, Table } from '#src/ui/table.tsx';
import { type Relation, relationOf } from '../ends.ts';
import { type Measured, nameOf } from '../measured.ts';
import { differenceFigure, saysOf, verdict, WHAT } from './difference-words.ts';
import { TwoCourses } from './two-courses.tsx';

const courseOf = ({ reading, rep }: Measured, relation: Relation): ComparedCourse =>
  relation === 'reps'
    ? repCourse(rep.result, gatesOf(reading.result.rules))
    : sideCourse(reading.result);

/** Both courses in one plot, and by how much they differ. */
export function Differences({ pair }: { pair: readonly [Measured, Measured] }) {
  const [first, second] = pair;
  const relation = relationOf(first.end, second.end);
  const courses = [courseOf(first, relation), courseOf(second, relation)] as const;
  const difference = courseDifference(...courses);
  const provisional = pair.filter(({ reading }) => reading.provisional);
  return (
    <Section
      title="Courses"
      note={WHAT[relation]}
      margin={
        <>
          <p>
            Each band holds its true course 95 times in 100 under our error model, as seen from its
            own value at {courses[0].gates.from}°.
          </p>
          <p>
            At a gate, the ± is that of a single frame on each side: an average over several frames
            is known better, so it is never too narrow.
          </p>
          <p>
            <MethodLink to="reading">How a reading is computed</MethodLink>
          </p>
        </>
      }
    >
      <p className="mb-4 max-w-lead text-lead font-bold">{verdict(difference, relation)}</p>
      {provisional.length > 0 && (
        <div className="mb-4">
          <Caution title="Provisional.">
            {provisional.length === 2 ? 'Both rest' : 'One rests'} on tracked marks that nobody has
            looked at.
          </Caution>
        </div>
      )}
      <TwoCourses courses={courses} names={[nameOf(first), nameOf(second)]} />
      {difference && (
        <DifferenceTable difference={difference} relation={relation} gates={courses[0].gates} />
      )}
      <ul className="mt-4">
        {pair.map((each, n) => (
          <li key={n}>
            <Link
              to={paths.reading(each.end.visitId, each.end.side)}
              className="inline-block py-2.5"
            >
              {n === 0 ? 'First' : 'Second'}: the whole reading, “{each.reading.label}”
            </Link>
          </li>
        ))}
      </ul>
    </Section>
  );
}

type Row = { key: string; what: string; difference: Difference | null };

function DifferenceTable({
  difference,
  relation,
  gates,
}: {
  difference: CourseDifference;
  relation: Relation;
  gates: ComparedCourse['gates'];
}) {
  const columns: Column<Row>[] = [
    { key: 'what', label: 'Turn, second less first', cell: ({ what }) => <b>{what}</b> },
    {
      key: 'figure',
      label: 'Difference',
      cell: ({ difference: own }) => (own ? differenceFigure(own) : 'unknown'),
    },
    {
      key: 'says',
      label: 'What that says',
      cell: ({ difference: own }) => <span className="text-soft">{saysOf(own, relation)}</span>,
    },
  ];
  const rows: Row[] = [
    { key: 'from', what: `at ${gates.from}° of lift`, difference: difference.atFrom },
    { key: 'to', what: `at ${gates.to}° of lift`, difference: difference.atTo },
    { key: 'change', what: `from ${gates.from}° to ${gates.to}°`, difference: difference.change },
  ];
  return (
    <div className="mt-5">
      <Table
        caption="By how much they differ"
        columns={columns}
        rows={rows}
        rowKey={({ key }) => key}
      />
    </div>
  );
}

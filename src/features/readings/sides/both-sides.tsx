import { Link } from 'react-router-dom';
import type { Reading, SidePage } from '#shared/contracts/readings.ts';
import type { Side } from '#shared/contracts/primitives.ts';
import type { Call } from '#shared/contracts/calls.ts';
import { otherSide } from '#shared/landmarks/types.ts';
import { degrees, inWords, plusMinus, turn } from '#src/ui/figures.ts';
import { Section } from '#src/ui/page.tsx';
import { paths } from '#src/ui/paths.ts';
import { SEEN_WORDS } from '#src/ui/words.ts';
import { turnsToHold } from '#shared/plots/course-shapes.ts';
import { gatesOf, sameGates } from '#shared/protocol/protocol.ts';
import { ReadingCourse } from '../course/reading-course.tsx';

const reachOf = ({ course, rules }: Reading['result']): number[] => [
  ...turnsToHold(course, gatesOf(rules)),
];

/** Both support sides of the visit, each with its own reading; never averaged. */
export function BothSides({ page, reading }: { page: SidePage; reading: Reading }) {
  const other = otherSide(page.side);
  const { otherSide: there, compared } = page;
  return (
    <Section title="Both sides" wide note="Standing on the one leg, then on the other.">
      {there?.reading ? (
        <>
          <div className="grid gap-8 tablet:grid-cols-2">
            <OneSide reading={reading} calls={page.calls} reach={reachOf(there.reading.result)} />
            <OneSide reading={there.reading} calls={there.calls} reach={reachOf(reading.result)} />
          </div>
          <p className="mt-4 max-w-lead">
            {compared ? (
              <b>{differenceWords(compared)}</b>
            ) : sameGates(gatesOf(reading.result.rules), gatesOf(there.reading.result.rules)) ? (
              'The sides cannot be compared.'
            ) : (
              'The sides were read between different gates and cannot be compared: read the older one again.'
            )}{' '}
            <Link to={paths.reading(page.visit.id, other)}>Open the {other} side</Link>
          </p>
          <p>
            <Link
              to={comparePath(page, { visitId: page.visit.id, side: other })}
              className="inline-block py-2.5"
            >
              Play both sides together, matched by lift
            </Link>
          </p>
        </>
      ) : there ? (
        <p className="max-w-lead">
          Standing on the {other} nothing is marked yet.{' '}
          <Link to={paths.reading(page.visit.id, other)}>Open the {other} side</Link>
        </p>
      ) : (
        <p className="max-w-lead">
          The {other} side has no call by eye yet, so its figures stay hidden.{' '}
          <Link to={paths.call(page.visit.id, other)}>Make the call for the {other} side</Link>
        </p>
      )}
    </Section>
  );
}

const comparePath = (page: SidePage, second: { visitId: string; side: Side }): string =>
  paths.compare({
    athlete: page.athlete.id,
    first: `${page.visit.id}.${page.side}`,
    second: `${second.visitId}.${second.side}`,
  });

/** Left less right. */
export const differenceWords = ({
  difference,
  plusMinus: pm,
  differ,
}: NonNullable<SidePage['compared']>): string =>
  differ
    ? `The sides differ by ${degrees(Math.abs(difference))} ${plusMinus(pm)}: more than this test’s error; the ${difference > 0 ? 'left' : 'right'} turns out more.`
    : `No difference that this test can show (${degrees(Math.abs(difference))} ${plusMinus(pm)}).`;

function OneSide({
  reading,
  calls,
  reach,
}: {
  reading: Reading;
  calls: readonly Call[];
  reach: readonly number[];
}) {
  const { result, side, change } = reading;
  const used = result.reps.filter(({ used }) => used).length;
  const first = calls[0];
  return (
    <div>
      <h3 className="text-sub font-bold">Standing on the {side}</h3>
      <p>
        <b>{reading.label}</b>
      </p>
      <p className="text-note text-soft">
        {change !== null &&
          reading.plusMinus !== null &&
          `${turn(change)} ${plusMinus(reading.plusMinus)}, ${inWords(used)} ${used === 1 ? 'rep' : 'reps'}. `}
        {first && `By eye: ${SEEN_WORDS[first.seen].toLowerCase()}.`}
      </p>
      <div className="mt-2">
        <ReadingCourse result={result} side={side} height={300} small reach={reach} />
      </div>
    </div>
  );
}
